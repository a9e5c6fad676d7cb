import type { Given } from '@/shared/rules/first-species/folds'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species } from '@/shared/rules/rule'
import { HALF_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import { stepsFrom } from '@/shared/theory/interval'

export const SECOND_SPECIES: ReadonlySet<Species> = new Set([2])

/** The second half of a bar begins here. */
export const isUpbeat = ({ place }: Moment): boolean => place === HALF_TICKS

/** What a moment sounds of its own bar. A tie onward does not count: it is not known until the next bar is. */
export const ticksInBar = ({ place, ticks }: Moment): number => Math.min(ticks, WHOLE_TICKS - place)

/** Signed steps of the line from one sonority to another: a third down is −2. */
export const stepsTo = (before: Sonority, now: Sonority): number => stepsFrom(before.note, now.note)

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

/** The note before in the same bar, and a weak note that waits to be judged with the one after it. */
export type WeakState = Readonly<{
  exercise: Exercise
  before: Sonority | null
  waiting: Readonly<{ from: Sonority | null; at: Sonority }> | null
}>

/**
 * Folds a rule of notes off the downbeat that `concerns` picks out. Each is judged twice: when it enters, with `to`
 * still `null`, and, if nothing was said then, together with the note it goes to. `from` is `null` after a rest.
 */
export function weakNotes<Params>(
  concerns: (at: Sonority) => boolean,
  judge: (from: Sonority | null, at: Sonority, to: Sonority | null, given: Given<Params>) => Breach | null,
): Fold<WeakState, Params> {
  return {
    start: (exercise) => ({ exercise, before: null, waiting: null }),
    step: ({ exercise, before, waiting }, moment, params) => {
      const now = sonorityOf(moment)
      const given = { exercise, params, moment }
      const left = waiting && now ? judge(waiting.from, waiting.at, now, given) : null
      const isWeak = now !== null && now.place > 0 && concerns(now)
      const entered = isWeak ? judge(before, now, null, given) : null
      // The first note of the next bar is no weak note, so that the last of this one need not be known to it.
      const isLastOfBar = moment.place + ticksInBar(moment) >= WHOLE_TICKS
      return {
        state: {
          exercise,
          before: isLastOfBar ? null : now,
          waiting: isWeak && entered === null ? { from: before, at: now } : null,
        },
        breach: left ?? entered,
      }
    },
    finish: () => null,
    key: ({ before, waiting }) =>
      pack(
        [packPitch(before && before.note), PITCH_ROOM],
        [waiting === null ? 0 : 1, 2],
        [packPitch(waiting && waiting.at.note), PITCH_ROOM],
        [packPitch(waiting && waiting.from && waiting.from.note), PITCH_ROOM],
      ),
    reach: 2,
  }
}
