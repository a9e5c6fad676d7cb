import { isDissonance, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Given } from '@/shared/rules/first-species/folds'
import { packPitch } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species } from '@/shared/rules/rule'
import { HALF_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import { stepsFrom } from '@/shared/theory/interval'
import { comparePitches } from '@/shared/theory/pitch'

export const FOURTH_SPECIES: ReadonlySet<Species> = new Set([4])

/** Species in which notes are tied over the bar line. */
export const TIED_SPECIES: ReadonlySet<Species> = new Set([4, 5])

/** What a moment sounds of its own bar. Ties onward do not count: they are not known until the next bar is. */
export const ticksInBar = ({ place, ticks }: Moment): number => Math.min(ticks, WHOLE_TICKS - place)

/** A note held over the bar line, whatever it has become there. */
export const isTiedOver = ({ place, isStruck }: Sonority): boolean => place === 0 && !isStruck

/** A note held over the bar line that has become a dissonance there. */
export const isSuspension = (now: Sonority): boolean => isTiedOver(now) && isDissonance(now)

/** The second half of a bar, where the note that is to be tied begins. */
export const isUpbeat = ({ place }: Moment): boolean => place === HALF_TICKS

export const isStepDown = (before: Sonority, now: Sonority): boolean =>
  stepsFrom(before.note, now.note) === -1

export const isStepUp = (before: Sonority, now: Sonority): boolean => stepsFrom(before.note, now.note) === 1

/** True when the line's note lies above that of the cantus, or meets it. Crossed voices swap their names. */
export const isAboveCantus = ({ note, other }: Sonority): boolean => comparePitches(note, other) >= 0

type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

export type AfterState = Readonly<{ exercise: Exercise; before: Sonority | null }>

/**
 * Folds a rule that looks at what follows certain sonorities. Only those are remembered, so that all the others come to
 * one state. `keeps` must know them from the note, its cantus note and a place that all of them share.
 */
export function afterSome<Params>(
  keeps: (now: Sonority, given: Given<Params>) => boolean,
  judge: (before: Sonority, now: Sonority, given: Given<Params>) => Breach | null,
): Fold<AfterState, Params> {
  return {
    start: (exercise) => ({ exercise, before: null }),
    step: ({ exercise, before }, moment, params) => {
      const now = sonorityOf(moment)
      const given = { exercise, params, moment }
      return {
        state: { exercise, before: now && keeps(now, given) ? now : null },
        breach: before && now && judge(before, now, given),
      }
    },
    finish: () => null,
    key: ({ before }) => packPitch(before && before.note),
    reach: 1,
  }
}
