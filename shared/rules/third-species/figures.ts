import type { Sonority } from '@/shared/rules/first-species/sonority'
import { stepsTo } from '@/shared/rules/second-species/folds'
import { isWeakDissonance, quarterOf, type Moves } from '@/shared/rules/third-species/folds'

/**
 * What the note before makes with the notes on both sides of it, as far as dissonance makes it anyone's matter.
 * `leapt-into`: the note now is a dissonance that no step leads into. `leapt-from`: a leap that belongs to no figure.
 * The others are named by their figures; each but `passing` is the matter of one rule, so that one fault is told once.
 */
export type Figure =
  'passing' | 'double-passing' | 'neighbour' | 'cambiata' | 'double-neighbour' | 'leapt-from' | 'leapt-into'

export function figureAt({ before, entry }: Moves, now: Sonority): Figure | null {
  if (before === null) return isWeakDissonance(now) ? 'leapt-into' : null
  const exit = stepsTo(before, now)
  const isDissonantNow = isWeakDissonance(now)
  if (isWeakDissonance(before) && entry !== 0) return figureOfDissonance(entry, exit, isDissonantNow)
  // A second quarter that is consonant itself may stand for the upper or lower note of a double neighbour.
  if (isDissonantNow && entry !== 0 && quarterOf(before) === 2 && exit === -2 * entry)
    return 'double-neighbour'
  // A dissonance that no step led into was told when it came; it is not told again for where it goes.
  return isDissonantNow && Math.abs(exit) > 1 && !isWeakDissonance(before) ? 'leapt-into' : null
}

function figureOfDissonance(entry: number, exit: number, isDissonantNow: boolean): Figure | null {
  if (exit === entry) return isDissonantNow ? 'double-passing' : 'passing'
  if (exit === -entry) return 'neighbour'
  if (exit === 2 * entry) return 'cambiata'
  if (exit === -2 * entry) return 'double-neighbour'
  // A repeated note is the matter of `s3-repeat`.
  return exit === 0 ? null : 'leapt-from'
}

/** The notes of a figure that there are, in order. */
export const notesOf = ({ from, before }: Moves, now: Sonority): readonly Sonority[] =>
  [from, before, now].filter((note): note is Sonority => note !== null)
