import type { Clef } from '@/shared/theory/clef'
import type { Alteration, Letter, Pitch } from '@/shared/theory/pitch'
import type { GlyphName } from '@/shared/notation/glyphs'

/** Order in which sharps enter a signature; flats enter backwards. */
const SHARP_ORDER: readonly Letter[] = ['F', 'C', 'G', 'D', 'A', 'E', 'B']
const FLAT_ORDER: readonly Letter[] = [...SHARP_ORDER].reverse()

type SignaturePlaces = Readonly<{ sharps: readonly number[]; flats: readonly number[] }>

const TREBLE: SignaturePlaces = { sharps: [8, 5, 9, 6, 3, 7, 4], flats: [4, 7, 3, 6, 2, 5, 1] }
const lowered = ({ sharps, flats }: SignaturePlaces, by: number): SignaturePlaces => ({
  sharps: sharps.map((place) => place - by),
  flats: flats.map((place) => place - by),
})

/**
 * Places of the accidentals above the bottom line. Every clef keeps the pattern of the treble, except the sharps of the
 * tenor clef, which rise from the second line so as to stay on the staff. Gould, Behind Bars (2011), the chapter on
 * accidentals and key signatures; from memory.
 */
const PLACES: Readonly<Record<Clef, SignaturePlaces>> = {
  treble: TREBLE,
  'treble-8vb': TREBLE,
  alto: lowered(TREBLE, 1),
  tenor: { sharps: [2, 6, 3, 7, 4, 8, 5], flats: lowered(TREBLE, -1).flats },
  bass: lowered(TREBLE, 2),
}

/** The accidentals of a signature (sharps positive, flats negative, at most seven), from left to right. */
export function signatureMarks(
  signature: number,
  clef: Clef,
): readonly { glyph: GlyphName; place: number }[] {
  const isSharp = signature > 0
  const places = isSharp ? PLACES[clef].sharps : PLACES[clef].flats
  const glyph: GlyphName = isSharp ? 'accidentalSharp' : 'accidentalFlat'
  return places.slice(0, Math.abs(signature)).map((place) => ({ glyph, place }))
}

/** What a signature does to a letter: with one flat, B is -1 and every other letter 0. */
export function signatureAlteration(signature: number, letter: Letter): Alteration {
  const order = signature > 0 ? SHARP_ORDER : FLAT_ORDER
  if (!order.slice(0, Math.abs(signature)).includes(letter)) return 0
  return signature > 0 ? 1 : -1
}

const ACCIDENTALS: Readonly<Record<Alteration, GlyphName>> = {
  [-2]: 'accidentalDoubleFlat',
  [-1]: 'accidentalFlat',
  0: 'accidentalNatural',
  1: 'accidentalSharp',
  2: 'accidentalDoubleSharp',
}

/** The accidental a pitch needs when `standing` is in force on its place; null when it needs none. */
export const accidentalFor = (pitch: Pitch, standing: Alteration): GlyphName | null =>
  pitch.alteration === standing ? null : ACCIDENTALS[pitch.alteration]
