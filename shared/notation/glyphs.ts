/**
 * The music glyphs the engraver draws and their code points in the Standard Music Font Layout (SMuFL 1.4). The one
 * table from which the outline table (`bravura.ts`) is built and any subset of the font is cut.
 */
export const GLYPH_CODEPOINTS = {
  gClef: 0xe050,
  gClef8vb: 0xe052,
  cClef: 0xe05c,
  fClef: 0xe062,
  timeSigCutCommon: 0xe08b,
  noteheadWhole: 0xe0a2,
  noteheadHalf: 0xe0a3,
  noteheadBlack: 0xe0a4,
  augmentationDot: 0xe1e7,
  flag8thUp: 0xe240,
  flag8thDown: 0xe241,
  accidentalFlat: 0xe260,
  accidentalNatural: 0xe261,
  accidentalSharp: 0xe262,
  accidentalDoubleSharp: 0xe263,
  accidentalDoubleFlat: 0xe264,
  restWhole: 0xe4e3,
  restHalf: 0xe4e4,
  restQuarter: 0xe4e5,
  rest8th: 0xe4e6,
} as const

export type GlyphName = keyof typeof GLYPH_CODEPOINTS
