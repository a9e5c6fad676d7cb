import { columnTicks, type Column } from '@/shared/notation/bar-content'
import { WHOLE_TICKS } from '@/shared/theory/duration'

/*
 * Optical spacing: a note of twice the length gets about one and a half times the room, as Gould, Behind Bars, has it
 * (from memory), and never less than what stands beside it needs.
 */

/** The moments of a bar on all its staves. */
export type Moments = Readonly<{
  /** Places in ticks, ascending. */
  ticks: readonly number[]
  /** The nearest each may stand to the first. */
  leastXs: readonly number[]
  /** How much of the room to spare goes after each: a whole bar's note counts 1. */
  shares: readonly number[]
  /** The width the notes would have, all told. */
  idealStaffSpaces: number
}>

const COLUMN_GAP = 0.4
const FIGURE_GAP = 0.45
const LEAST_ADVANCE = 0.8
const IDEAL_LEAD = 1.5
const IDEAL_WHOLE = 5.2
const LENGTH_EXPONENT = 0.58

type Figure = Readonly<{ tick: number; half: number }>
type Standing = Readonly<{ tick: number; left: number; right: number; gap: number }>

export function spaceMoments(
  staves: readonly (readonly Column[])[],
  figures: readonly Figure[],
  spacePx: number,
): Moments {
  const rows: readonly (readonly Standing[])[] = [
    ...staves.map((columns) =>
      columns.map(({ tick, box }) => ({ tick, left: box.left, right: box.right, gap: COLUMN_GAP * spacePx })),
    ),
    figures.map(({ tick, half }) => ({ tick, left: -half, right: half, gap: FIGURE_GAP * spacePx })),
  ]
  const ticks = [...new Set(rows.flatMap((row) => row.map(({ tick }) => tick)))].sort((a, b) => a - b)
  const leastXs: number[] = []
  // What has been passed on each row, as the x it ends at.
  const ends = rows.map(() => -Infinity)
  ticks.forEach((tick, i) => {
    let x = i === 0 ? 0 : (leastXs[i - 1] as number) + LEAST_ADVANCE * spacePx
    const here = rows.map((row) => row.find((standing) => standing.tick === tick))
    here.forEach((standing, r) => {
      if (standing) x = Math.max(x, (ends[r] as number) + standing.gap - standing.left)
    })
    here.forEach((standing, r) => {
      if (standing) ends[r] = x + standing.right
    })
    leastXs.push(x)
  })
  const shares = columnTicks(ticks.map((tick) => ({ tick }))).map((length) =>
    Math.pow(length / WHOLE_TICKS, LENGTH_EXPONENT),
  )
  const sum = shares.reduce((total, share) => total + share, 0)
  const idealStaffSpaces = ticks.length > 1 ? IDEAL_LEAD + IDEAL_WHOLE * sum : 0
  return { ticks, leastXs, shares, idealStaffSpaces }
}
