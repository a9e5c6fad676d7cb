import type { PitchName } from '@/shared/theory/pitch'

/** One written note or rest. `pitch` is null for a rest; `tied` holds the note over into the next one. */
export type Note = Readonly<{ pitch: PitchName | null; ticks: number; tied?: true | undefined }>

/** What one bar of a line holds, in order. First species has one whole note; an empty bar is not in the score. */
export type BarNotes = readonly Note[]

/** A line: what is written in each bar, by 1-based bar number. A bar that is missing is unwritten. */
export type Line = Readonly<Record<number, BarNotes>>
