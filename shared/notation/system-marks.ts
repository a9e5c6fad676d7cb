import { CLOSING_WIDTH_STAFF_SPACES } from '@/shared/notation/bar-measure'
import { BRAVURA, ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import { signatureMarks } from '@/shared/notation/key-signature'
import { barlinePx, glyphMark, rectangleMark, ruleMark, staffLinePx, type Mark } from '@/shared/notation/mark'
import type { StaffLayout } from '@/shared/notation/score-layout'
import { CLEF_PLACES, depthStaffSpaces, STAFF_LINES } from '@/shared/notation/staff-place'
import type { Clef } from '@/shared/theory/clef'

const CLEF_INSET = 0.7
const SIGNATURE_GAP = 0.55
const SIGNATURE_APART = 0.12
export const PREFIX_GAP = 0.75

const clefsWidth = (clefs: readonly Clef[]): number =>
  Math.max(...clefs.map((clef) => BRAVURA[CLEF_PLACES[clef].glyph].right))

/** Width of clefs and signature before the first bar, in px. */
export function prefixWidthPx(clefs: readonly Clef[], signature: number, spacePx: number): number {
  const signatureWidth = Math.max(
    ...clefs.map((clef) =>
      signatureMarks(signature, clef).reduce(
        (sum, { glyph }) => sum + BRAVURA[glyph].right + SIGNATURE_APART,
        0,
      ),
    ),
  )
  const width =
    CLEF_INSET + clefsWidth(clefs) + (signatureWidth > 0 ? SIGNATURE_GAP + signatureWidth : 0) + PREFIX_GAP
  return Math.ceil(width * spacePx)
}

/** Clefs and signatures of every staff, and the line that joins two staves. */
export function prefixMarks(
  staves: readonly StaffLayout[],
  signature: number,
  spacePx: number,
): readonly Mark[] {
  const signatureX = CLEF_INSET + clefsWidth(staves.map(({ clef }) => clef)) + SIGNATURE_GAP
  const marks = staves.flatMap(({ clef, topPx, voice }): Mark[] => {
    const yOf = (place: number): number => topPx + depthStaffSpaces(place) * spacePx
    const { glyph, place } = CLEF_PLACES[clef]
    const clefMark = glyphMark(
      { role: 'clef', ink: 'cantus', group: `clef ${voice}` },
      glyph,
      CLEF_INSET * spacePx,
      yOf(place),
      spacePx,
    )
    let x = signatureX * spacePx
    // Flats and sharps of a signature tuck into each other; they are one group.
    const name = { role: 'signature', ink: 'cantus', group: `signature ${voice}` } as const
    const signs = signatureMarks(signature, clef).map((sign) => {
      const mark = glyphMark(name, sign.glyph, x, yOf(sign.place), spacePx)
      x += (BRAVURA[sign.glyph].right + SIGNATURE_APART) * spacePx
      return mark
    })
    return [clefMark, ...signs]
  })
  if (staves.length < 2) return marks
  const top = staves[0]?.topPx ?? 0
  const bottom = (staves.at(-1)?.topPx ?? 0) + 4 * spacePx
  const thickness = barlinePx(spacePx)
  const name = { role: 'barline', ink: 'barline', group: 'systemic' } as const
  return [rectangleMark(name, { left: 0, right: thickness, top, bottom }), ...marks]
}

export const METRE_GAP = 0.5

/** Width of the sign for cut time after the other signs of the first system, in px. */
export const metreWidthPx = (spacePx: number): number =>
  Math.ceil((BRAVURA.timeSigCutCommon.right + METRE_GAP) * spacePx)

/** The sign of the metre on every staff, `xPx` from the left. */
export const metreMarks = (staves: readonly StaffLayout[], xPx: number, spacePx: number): readonly Mark[] =>
  staves.map(({ topPx, voice }) =>
    glyphMark(
      { role: 'metre', ink: 'cantus', group: `metre ${voice}` },
      'timeSigCutCommon',
      xPx,
      topPx + 2 * spacePx,
      spacePx,
    ),
  )

export function staffLineMarks(
  staves: readonly StaffLayout[],
  widthPx: number,
  spacePx: number,
): readonly Mark[] {
  const thickness = staffLinePx(spacePx)
  return staves.flatMap(({ topPx, voice }) =>
    Array.from({ length: STAFF_LINES }, (_, i) => {
      const y = topPx + i * spacePx
      return ruleMark(
        { role: 'staff-line', ink: 'staff', group: `staff ${voice}` },
        [0, y],
        [widthPx, y],
        thickness,
      )
    }),
  )
}

/** The bar line at the right edge of a system: thin between systems, thin and thick at the close. */
export function endBarlineMarks(
  staves: readonly StaffLayout[],
  widthPx: number,
  spacePx: number,
  isClosing: boolean,
): readonly Mark[] {
  const half = staffLinePx(spacePx) / 2
  const top = Math.round((staves[0]?.topPx ?? 0) - half)
  const bottom = Math.round((staves.at(-1)?.topPx ?? 0) + 4 * spacePx + half)
  const name = { role: 'barline', ink: 'barline', group: 'end' } as const
  const thin = barlinePx(spacePx)
  if (!isClosing) return [rectangleMark(name, { left: widthPx - thin, right: widthPx, top, bottom })]
  const thick = Math.round(ENGRAVING_DEFAULTS.thickBarlineThickness * spacePx)
  const left = Math.round(widthPx - CLOSING_WIDTH_STAFF_SPACES * spacePx)
  return [
    rectangleMark({ ...name, ink: 'barline' }, { left, right: left + thin, top, bottom }),
    rectangleMark({ ...name, ink: 'cantus' }, { left: widthPx - thick, right: widthPx, top, bottom }),
  ]
}
