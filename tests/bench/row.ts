/** One line of the table: a piece of work, measured several times. */
export type BenchRow = Readonly<{
  /** Its name in the goals, such as `E1`. */
  line: string
  /** What was done, in words, with the sizes that matter. */
  work: string
  /** One figure a run, in `unit`. The table shows their median, 95th percentile and number. */
  samples: readonly number[]
  /** Such as `µs`, `ms`, `KB`, `×` for a ratio to a peer measured in the same run. */
  unit: string
  /** What is aimed at, in words; shown, never asserted. */
  goal: string
}>

/** A group of lines that are measured together. `tell` says what is going on, for whoever waits. */
export type BenchGroup = (tell: (progress: string) => void) => Promise<readonly BenchRow[]>

/** The value that `share` (0 to 1) of the samples do not exceed; nearest rank. */
export function percentileOf(samples: readonly number[], share: number): number {
  const sorted = [...samples].sort((a, b) => a - b)
  const rank = Math.max(1, Math.ceil(share * sorted.length))
  const value = sorted[rank - 1]
  if (value === undefined) throw new RangeError('There is no percentile of no samples.')
  return value
}
