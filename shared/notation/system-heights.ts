import { BRAVURA } from '@/shared/notation/bravura'
import { signatureMarks } from '@/shared/notation/key-signature'
import { textHeightPx } from '@/shared/notation/measure-text'
import type { ScoreSize, StaffLayout, Voice } from '@/shared/notation/score-layout'
import { letteringOf, SIZE_FACTS } from '@/shared/notation/sizes'
import { CLEF_PLACES, depthStaffSpaces } from '@/shared/notation/staff-place'
import type { Clef } from '@/shared/theory/clef'

const STAFF_HEIGHT = 4
/** Room kept free from the start, so that a usual note, number or arc moves nothing when it comes. */
const KEPT_OVER_STAFF = 1.1
const KEPT_UNDER_STAFF = 1.1
export const HOOK_STAFF_SPACES = 0.75
/** Distance of the second line over a frozen bar from the first: never so little that they run together. */
export const frozenLinesPx = (spacePx: number): number => Math.max(3, Math.round(0.34 * spacePx))
export const ARC_LEVEL_STAFF_SPACES = 1.4
const RAIL_PADDING = 0.45
export const BRACKET_HOOK_STAFF_SPACES = 0.7

/** The heights of a system, from its own top: where each row of it lies. */
export type SystemRows = Readonly<{
  heightPx: number
  staves: readonly StaffLayout[]
  railPx: number | null
  numberBaselinePx: number
  headLinePx: number
  /** Foot of the lowest arc; each level is `ARC_LEVEL_STAFF_SPACES` above the one before. */
  arcFootPx: number
  labelBaselinePx: number
  /** Bracket lines and the baselines of their labels, from the staff downwards. */
  brackets: readonly Readonly<{ linePx: number; baselinePx: number }>[]
}>

export type SystemContent = Readonly<{
  size: ScoreSize
  spacePx: number
  /** From the top downwards, with the extent of the notes on each around its own top line. */
  staves: readonly Readonly<{
    voice: Voice
    clef: Clef
    reach: Readonly<{ top: number; bottom: number }> | null
  }>[]
  /** Null where the staves have neither clef nor signature. */
  signature: number | null
  hasLabels: boolean
  arcLevels: number
  bracketLevels: number
}>

/** How far a clef and its signature reach above and below their staff, in staff spaces. */
function prefixReach(clef: Clef, signature: number): { over: number; under: number } {
  const marks = [CLEF_PLACES[clef], ...signatureMarks(signature, clef)]
  const reaches = marks.map(({ glyph, place }) => {
    const depth = depthStaffSpaces(place)
    return { over: BRAVURA[glyph].top - depth, under: depth - BRAVURA[glyph].bottom - STAFF_HEIGHT }
  })
  return {
    over: Math.max(...reaches.map(({ over }) => over)),
    under: Math.max(...reaches.map(({ under }) => under)),
  }
}

export function arrangeRows(content: SystemContent): SystemRows {
  const { size, spacePx, staves, signature, hasLabels, arcLevels, bracketLevels } = content
  const lettering = letteringOf(spacePx)
  const staffPx = STAFF_HEIGHT * spacePx
  const isMini = size === 'mini'
  const over = staves.map(({ reach }) => Math.max(KEPT_OVER_STAFF * spacePx, -(reach?.top ?? 0)))
  const under = staves.map(({ reach }) =>
    Math.max(KEPT_UNDER_STAFF * spacePx, (reach?.bottom ?? 0) - staffPx),
  )
  const clefs = staves.map(({ clef }) =>
    signature === null ? { over: 0, under: 0 } : prefixReach(clef, signature),
  )

  const numberBaselinePx = isMini
    ? 0
    : Math.ceil(0.2 * spacePx + textHeightPx('8', 'Alegreya', lettering.numberPx).above)
  const headLinePx = isMini ? 0 : Math.round(numberBaselinePx + 0.6 * spacePx)
  const headsPx = isMini
    ? 0
    : headLinePx + Math.max(HOOK_STAFF_SPACES * spacePx, frozenLinesPx(spacePx) + 1) + 0.2 * spacePx
  const arcsPx = isMini ? 0 : Math.max(1, arcLevels) * ARC_LEVEL_STAFF_SPACES * spacePx
  const arcFootPx = Math.round(headsPx + arcsPx)
  const firstTop = Math.ceil(
    Math.max(arcFootPx + 0.2 * spacePx + (over[0] as number), (clefs[0]?.over ?? 0) * spacePx),
  )

  const tops = [firstTop]
  let railPx: number | null = null
  if (staves.length === 2) {
    const figureHalf = textHeightPx('8', 'Alegreya', lettering.figurePx).above / 2
    const railHalf = Math.max(figureHalf, 0.8 * spacePx) + RAIL_PADDING * spacePx
    const used = (under[0] as number) + (over[1] as number)
    const clefGap = ((clefs[0]?.under ?? 0) + (clefs[1]?.over ?? 0) + 0.5) * spacePx
    const gap = Math.round(Math.max(SIZE_FACTS[size].staffGap * spacePx, used + 2 * railHalf, clefGap))
    // In the middle while the notes leave it room there, else as near as they do.
    const low = firstTop + staffPx + (under[0] as number) + railHalf
    const high = firstTop + staffPx + gap - (over[1] as number) - railHalf
    railPx = Math.min(Math.max(firstTop + staffPx + gap / 2, low), high)
    tops.push(firstTop + staffPx + gap)
  }

  const last = staves.length - 1
  let y = (tops[last] as number) + staffPx + (under[last] as number)
  const clefFootPx = (tops[last] as number) + staffPx + (clefs[last]?.under ?? 0) * spacePx
  const label = textHeightPx('b', 'AlegreyaSans', lettering.labelPx)
  const labelBaselinePx = Math.round(y + 0.2 * spacePx + label.above)
  if (hasLabels) y = labelBaselinePx + label.below
  const text = textHeightPx('b', 'AlegreyaItalic', lettering.bracketPx)
  const brackets = Array.from({ length: bracketLevels }, () => {
    const linePx = Math.round(y + (0.6 + BRACKET_HOOK_STAFF_SPACES) * spacePx)
    const baselinePx = Math.round(linePx + 0.1 * spacePx + text.above)
    y = baselinePx + text.below
    return { linePx, baselinePx }
  })

  return {
    heightPx: Math.ceil(Math.max(y, clefFootPx) + 1),
    staves: staves.map(({ voice, clef }, i) => ({ voice, clef, topPx: tops[i] as number })),
    railPx: railPx === null ? null : Math.round(railPx),
    numberBaselinePx,
    headLinePx,
    arcFootPx,
    labelBaselinePx,
    brackets,
  }
}
