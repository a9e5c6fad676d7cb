import { BRAVURA, OUTLINE_UNITS_PER_STAFF_SPACE } from '@/shared/notation/bravura'
import type { GlyphName } from '@/shared/notation/glyphs'

const round = (value: number): number => Math.round(value * 100) / 100

/** A glyph's outline as SVG path data, its origin at (x, y) and set at `spacePx` to the staff space. */
export function glyphPath(glyph: GlyphName, x: number, y: number, spacePx: number): string {
  const scale = spacePx / OUTLINE_UNITS_PER_STAFF_SPACE
  return BRAVURA[glyph].outline
    .map(([letter, ...coordinates]) => {
      const placed = coordinates.map((value, i) => round(i % 2 === 0 ? x + value * scale : y - value * scale))
      return letter + placed.join(' ')
    })
    .join('')
}
