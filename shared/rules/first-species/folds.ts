import { z } from 'zod'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { packPitch } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species } from '@/shared/rules/rule'

/** For rules that have nothing to choose. */
export const NO_PARAMS = z.strictObject({})
export type NoParams = z.infer<typeof NO_PARAMS>

export const FIRST_SPECIES: ReadonlySet<Species> = new Set([1])

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

/** What a judge is told beside the sonorities. */
export type Given<Params> = Readonly<{ exercise: Exercise; params: Params; moment: Moment }>

/** Folds a rule that looks at each sonority by itself and remembers nothing. */
export function eachSonority<Params>(
  judge: (now: Sonority, given: Given<Params>) => Breach | null,
): Fold<Exercise, Params> {
  return {
    start: (exercise) => exercise,
    step: (exercise, moment, params) => {
      const now = sonorityOf(moment)
      return { state: exercise, breach: now && judge(now, { exercise, params, moment }) }
    },
    finish: () => null,
    key: () => 0,
    reach: 0,
  }
}

export type NeighbourState = Readonly<{ exercise: Exercise; before: Sonority | null }>

/**
 * Folds a rule that looks at two neighbouring sonorities. Bars set aside are not read, so that the neighbours are
 * those of the reduction; a gap in the line leaves no neighbour.
 */
export function neighbours<Params>(
  judge: (before: Sonority, now: Sonority, given: Given<Params>) => Breach | null,
): Fold<NeighbourState, Params> {
  return {
    start: (exercise) => ({ exercise, before: null }),
    step: ({ exercise, before }, moment, params) => {
      const now = sonorityOf(moment)
      return {
        state: { exercise, before: now },
        breach: before && now && judge(before, now, { exercise, params, moment }),
      }
    },
    finish: () => null,
    // The cantus note under it is known from the place in the reading.
    key: ({ before }) => packPitch(before && before.note),
    reach: 1,
  }
}
