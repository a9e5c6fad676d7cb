import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import { breachAt, degreeIn, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, packPitch } from '@/shared/rules/fold'
import { isSuspension } from '@/shared/rules/fourth-species/folds'
import type { Breach, Exercise, Moment, Position, Rule } from '@/shared/rules/rule'

export type CadenceState = Readonly<{ exercise: Exercise; held: Sonority | null }>

/** The note held over into the last bar but one makes a seventh above a cantus on its second degree, a second below. */
const HELD_STEPS: Readonly<Record<Position, number>> = { above: 6, below: 1 }

/**
 * Judges the note before the last, and what was held before it. Where the cantus comes to its final from below the line
 * has the second degree, and no source asks for a suspension.
 */
export function judgeTiedCadence(held: Sonority | null, now: Sonority, exercise: Exercise): Breach | null {
  const breach = judgePenultimate(now, exercise)
  if (breach !== null || degreeIn(now.other, exercise) !== 2) return breach
  const isHeld = held !== null && held.simpleSteps === HELD_STEPS[exercise.position]
  return isHeld ? null : breachAt('no-suspension', [now])
}

/** Folds a rule that looks at the note before the last together with the dissonance that its bar began with. */
export const tiedCadence = <Params>(
  judge: (
    held: Sonority | null,
    now: Sonority,
    exercise: Exercise,
    params: Params,
    moment: Moment,
  ) => Breach | null,
): Pick<Rule<CadenceState, Params>, 'start' | 'step' | 'finish' | 'key'> => ({
  start: (exercise) => ({ exercise, held: null }),
  step: ({ exercise, held }, moment, params) => {
    const now = sonorityOf(moment)
    const kept = moment.place === 0 ? null : held
    const next = now !== null && isSuspension(now) ? now : kept
    if (now === null || !moment.isPenultimate) return goOn({ exercise, held: now === null ? null : next })
    return { state: { exercise, held: next }, breach: judge(next, now, exercise, params, moment) }
  },
  finish: () => null,
  key: ({ held }) => packPitch(held && held.note),
})
