import { readFileSync } from 'node:fs'
import { join } from 'node:path'
import { BRAVURA, ENGRAVING_DEFAULTS, OUTLINE_UNITS_PER_STAFF_SPACE } from '@/shared/notation/bravura'
import { GLYPH_CODEPOINTS, type GlyphName } from '@/shared/notation/glyphs'

type Metadata = {
  engravingDefaults: Record<string, number>
  glyphAdvanceWidths: Record<string, number>
  glyphBBoxes: Record<string, { bBoxNE: [number, number]; bBoxSW: [number, number] }>
  glyphsWithAnchors: Record<string, Record<string, number[]>>
}

const metadata = JSON.parse(
  readFileSync(join(__dirname, '../../../node_modules/@vexflow-fonts/bravura/metadata.json'), 'utf8'),
) as Metadata

const NAMES = Object.keys(GLYPH_CODEPOINTS) as GlyphName[]

/** Extent of an outline's points on one axis in staff spaces; the curves of these glyphs have points at their extremes. */
function extent(name: GlyphName, axis: 0 | 1): [number, number] {
  const values = BRAVURA[name].outline.flatMap(([, ...coordinates]) =>
    coordinates.filter((_, i) => i % 2 === axis),
  )
  return [
    Math.min(...values) / OUTLINE_UNITS_PER_STAFF_SPACE,
    Math.max(...values) / OUTLINE_UNITS_PER_STAFF_SPACE,
  ]
}

describe('the table of Bravura', () => {
  test('has a row for every glyph of the code point table and no other', () => {
    expect(Object.keys(BRAVURA)).toEqual(NAMES)
    expect(new Set(Object.values(GLYPH_CODEPOINTS)).size).toBe(NAMES.length)
  })

  test.each(NAMES)('says of %s what the font’s own metadata says', (name) => {
    const glyph = BRAVURA[name]
    const box = metadata.glyphBBoxes[name]
    expect(glyph.codepoint).toBe(GLYPH_CODEPOINTS[name])
    expect([glyph.left, glyph.bottom]).toEqual(box?.bBoxSW)
    expect([glyph.right, glyph.top]).toEqual(box?.bBoxNE)
    expect(glyph.advance).toBe(metadata.glyphAdvanceWidths[name])
    expect(glyph.anchors).toEqual(metadata.glyphsWithAnchors[name] ?? {})
  })

  test.each(NAMES)('draws %s with an outline that fills its box: the code point is the right one', (name) => {
    const { left, right, bottom, top } = BRAVURA[name]
    const [x1, x2] = extent(name, 0)
    const [y1, y2] = extent(name, 1)
    expect(x1).toBeCloseTo(left, 1)
    expect(x2).toBeCloseTo(right, 1)
    expect(y1).toBeCloseTo(bottom, 1)
    expect(y2).toBeCloseTo(top, 1)
  })

  test('takes its thicknesses from the metadata', () => {
    for (const [key, value] of Object.entries(ENGRAVING_DEFAULTS))
      expect(value).toBe(metadata.engravingDefaults[key])
  })
})
