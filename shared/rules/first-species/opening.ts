import { z } from 'zod'
import type { Given } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  perfectKindOf,
  sizeOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { asRemark, goOn } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule } from '@/shared/rules/rule'

/** Intervals with which a line may begin or end. A fifth stands for the twelfth too, an octave for the fifteenth. */
export const OPENINGS = ['unison', 'fifth', 'octave'] as const
export type Opening = (typeof OPENINGS)[number]

export const openingList = (fallback: readonly Opening[], description: string) =>
  z
    .array(z.enum(OPENINGS))
    .default([...fallback])
    .describe(description)

/** Which of the perfect intervals stands between the voices, if any. */
export function openingOf(sonority: Sonority): Opening | null {
  const kind = perfectKindOf(sonority)
  if (kind !== 'octave') return kind
  return sonority.steps === 0 ? 'unison' : 'octave'
}

/** Judges the first sonority by the intervals a rule set allows, and by those it only tolerates. */
export function judgeOpening(
  now: Sonority,
  allowed: readonly Opening[],
  secondBest: readonly Opening[],
): Breach | null {
  const opening = openingOf(now)
  if (opening !== null && allowed.includes(opening)) return null
  const args = { interval: sizeOf(now), allowed: allowed.join(', ') }
  if (opening !== null && secondBest.includes(opening)) {
    return asRemark(breachAt('second-best', [now], args))
  }
  return breachAt(opening === null ? 'not-perfect' : 'not-allowed', [now], args)
}

/** `waitsIn` is the bar whose first note is still to come; 0 once the line has begun, or could not be read. */
export type OpeningState = Readonly<{ exercise: Exercise; waitsIn: number }>

/** True of the first note that sounds: the first of all, or one in the first bar with only rests before it. */
export const isOpening = ({ isFirst, bar }: Sonority, waitsIn: number): boolean => isFirst || bar === waitsIn

/** The bar that waits for its first note after a moment. */
export const waitsAfter = ({ note, isFirst, bar }: Moment, waitsIn: number): number =>
  note === 'rest' && (isFirst || bar === waitsIn) ? bar : 0

/** Folds a rule of the first sonority, whether or not a rest comes before it. */
export const openings = <Params>(
  judge: (now: Sonority, given: Given<Params>) => Breach | null,
): Pick<Rule<OpeningState, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'> => ({
  start: (exercise) => ({ exercise, waitsIn: 0 }),
  step: ({ exercise, waitsIn }, moment, params) => {
    const state = { exercise, waitsIn: waitsAfter(moment, waitsIn) }
    const now = sonorityOf(moment)
    if (now === null || !isOpening(now, waitsIn)) return goOn(state)
    return { state, breach: judge(now, { exercise, params, moment }) }
  },
  finish: () => null,
  key: ({ waitsIn }) => waitsIn,
  // Where nothing rests, none but the first note opens.
  reach: 0,
})
