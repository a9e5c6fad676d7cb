import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'

/** The written values of species: a breve and anything under an eighth note are not among them. */
export type NoteValue = 'whole' | 'half' | 'quarter' | 'eighth'

export type WrittenValue = Readonly<{ value: NoteValue; isDotted: boolean }>

const TICKS: Readonly<Record<NoteValue, number>> = {
  whole: WHOLE_TICKS,
  half: 2 * QUARTER_TICKS,
  quarter: QUARTER_TICKS,
  eighth: QUARTER_TICKS / 2,
}

/** Longest first; no dotted whole note, which is longer than a bar. */
const WRITTEN: readonly Readonly<{ ticks: number; written: WrittenValue }>[] = (
  ['whole', 'half', 'quarter', 'eighth'] as const
)
  .flatMap((value) => [
    { ticks: 1.5 * TICKS[value], written: { value, isDotted: true } },
    { ticks: TICKS[value], written: { value, isDotted: false } },
  ])
  .filter(({ ticks }) => ticks <= WHOLE_TICKS)

/** How a length is written; one that no single note has is written as the longest note that fits in it. */
export const valueOf = (ticks: number): WrittenValue =>
  WRITTEN.find((known) => known.ticks <= ticks)?.written ?? { value: 'eighth', isDotted: false }

export const ticksOf = ({ value, isDotted }: WrittenValue): number => TICKS[value] * (isDotted ? 1.5 : 1)
