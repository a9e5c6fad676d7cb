import { z } from 'zod'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, packPitch } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species } from '@/shared/rules/rule'

/** For rules that have nothing to choose. */
export const NO_PARAMS = z.strictObject({})
export type NoParams = z.infer<typeof NO_PARAMS>

export const FIRST_SPECIES: ReadonlySet<Species> = new Set([1])

/**
 * Species without an entry of their own for what happens where both voices move. In second and third species the rules
 * of the bar line take the place of these.
 */
export const BARE_SPECIES: ReadonlySet<Species> = new Set([1, 4, 5])

/** Third species has no entry of its own for the first interval. */
export const OPENED_AS_FIRST: ReadonlySet<Species> = new Set([1, 3])

/** Third species counts its bars by `s3-imperfect-run`, fourth its chains by `s4-chain-limit`. */
export const HEARD_ON_DOWNBEATS: ReadonlySet<Species> = new Set([1, 2, 5])

/** Species without a rule of their own for repeated notes. */
export const REPEATING_SPECIES: ReadonlySet<Species> = new Set([1, 4])

/** Species in which the downbeat is a note of its own; in fourth it is the upbeat's, held over. */
export const STRUCK_SPECIES: ReadonlySet<Species> = new Set([1, 2, 3, 5])

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

/**
 * Folds a rule that looks at the sonorities on either side of a bar line: the last of a bar and the first of the next.
 * In first species these are all the neighbours there are.
 */
export const acrossBars = <Params>(
  judge: (before: Sonority, now: Sonority, given: Given<Params>) => Breach | null,
): Fold<NeighbourState, Params> =>
  neighbours<Params>((before, now, given) => (before.bar === now.bar ? null : judge(before, now, given)))

/**
 * Folds a rule that looks at the downbeats of two neighbouring bars, whatever sounds between them. A bar that begins
 * with a rest has no downbeat, and leaves none to compare with.
 */
export function downbeats<Params>(
  judge: (before: Sonority, now: Sonority, given: Given<Params>) => Breach | null,
): Fold<NeighbourState, Params> {
  return {
    start: (exercise) => ({ exercise, before: null }),
    step: (state, moment, params) => {
      if (moment.place !== 0) return goOn(state)
      const { exercise, before } = state
      const now = sonorityOf(moment)
      return {
        state: { exercise, before: now },
        breach: before && now && judge(before, now, { exercise, params, moment }),
      }
    },
    finish: () => null,
    key: ({ before }) => packPitch(before && before.note),
  }
}
