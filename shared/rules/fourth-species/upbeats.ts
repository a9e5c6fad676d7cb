import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Given } from '@/shared/rules/first-species/folds'
import { isSuspension, isUpbeat } from '@/shared/rules/fourth-species/folds'
import type { Breach, Exercise, Rule } from '@/shared/rules/rule'

/** The bar's own upbeat, that of the bar before, and the note held over into this bar where it is a dissonance. */
export type UpbeatState = Readonly<{
  exercise: Exercise
  earlier: Sonority | null
  here: Sonority | null
  suspended: Sonority | null
}>

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key'>

/**
 * Folds a rule that compares the upbeats of two bars that follow each other, and knows whether the second one resolves
 * a suspension. A bar without an onset on its second half has no upbeat.
 */
export const upbeats = <Params>(
  judge: (
    earlier: Sonority,
    now: Sonority,
    suspended: Sonority | null,
    given: Given<Params>,
  ) => Breach | null,
): Fold<UpbeatState, Params> => ({
  start: (exercise) => ({ exercise, earlier: null, here: null, suspended: null }),
  step: ({ exercise, earlier, here, suspended }, moment, params) => {
    const now = sonorityOf(moment)
    if (moment.place === 0) {
      const held = now !== null && isSuspension(now) ? now : null
      return goOn({ exercise, earlier: here, here: null, suspended: held })
    }
    if (now === null || !isUpbeat(moment)) return goOn({ exercise, earlier, here, suspended })
    return {
      state: { exercise, earlier: null, here: now, suspended: null },
      breach: earlier && judge(earlier, now, suspended, { exercise, params, moment }),
    }
  },
  finish: () => null,
  key: ({ earlier, here, suspended }) =>
    pack(
      [packPitch(earlier && earlier.note), PITCH_ROOM],
      [packPitch(here && here.note), PITCH_ROOM],
      [packPitch(suspended && suspended.note), PITCH_ROOM],
    ),
})
