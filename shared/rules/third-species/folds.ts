import type { Given } from '@/shared/rules/first-species/folds'
import { isDissonance, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species } from '@/shared/rules/rule'
import { stepsTo } from '@/shared/rules/second-species/folds'
import { QUARTER_TICKS } from '@/shared/theory/duration'
import type { Direction } from '@/shared/theory/interval'

export const THIRD_SPECIES: ReadonlySet<Species> = new Set([3])

/** Which quarter of its bar a moment begins on, 1 to 4. */
export const quarterOf = ({ place }: Moment): number => Math.floor(place / QUARTER_TICKS) + 1

/** A dissonance off the downbeat; on it, it is the matter of `s3-first-consonant`. */
export const isWeakDissonance = (now: Sonority): boolean => now.place > 0 && isDissonance(now)

/**
 * The note before, the one before that, and which way a step led from one to the other: 0 where it was no step, or
 * where it does not matter, so that the states stay few.
 */
export type Moves = Readonly<{
  exercise: Exercise
  from: Sonority | null
  before: Sonority | null
  entry: Direction
}>

export const startMoves = (exercise: Exercise): Moves => ({ exercise, from: null, before: null, entry: 0 })

export function stepMoves({ exercise, before }: Moves, moment: Moment): Moves {
  const now = sonorityOf(moment)
  if (now === null) return startMoves(exercise)
  const steps = before === null ? 0 : stepsTo(before, now)
  // Which way it came matters for a dissonance, and for a second quarter that may begin a double neighbour.
  const matters = isWeakDissonance(now) || quarterOf(now) === 2
  const entry = matters && Math.abs(steps) === 1 ? (steps as Direction) : 0
  return { exercise, from: entry === 0 ? null : before, before: now, entry }
}

/** `from` is what a breach points back at; which way the line came from it is in `entry`. */
export const moveKey = ({ before, entry }: Moves): number =>
  pack([packPitch(before && before.note), PITCH_ROOM], [entry + 1, 3])

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

/** Folds a rule that looks at each note with the one before it and the step, if any, that led there. */
export const moves = <Params>(
  judge: (moves: Moves, now: Sonority, given: Given<Params>) => Breach | null,
): Fold<Moves, Params> => ({
  start: startMoves,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    return {
      state: stepMoves(state, moment),
      breach: now && judge(state, now, { exercise: state.exercise, params, moment }),
    }
  },
  finish: () => null,
  key: moveKey,
  reach: 2,
})
