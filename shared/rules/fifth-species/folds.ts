import type { Given } from '@/shared/rules/first-species/folds'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import { ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Breach, Exercise, Rule, Species } from '@/shared/rules/rule'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'

export const FIFTH_SPECIES: ReadonlySet<Species> = new Set([5])

export const EIGHTH_TICKS = QUARTER_TICKS / 2
export const DOTTED_HALF_TICKS = 3 * QUARTER_TICKS

/** Places and lengths fit into eighths of a bar; nothing finer is written in these species. */
const EIGHTHS_IN_BAR = WHOLE_TICKS / EIGHTH_TICKS

export const isEighth = (now: Sonority): boolean => ticksInBar(now) === EIGHTH_TICKS

/** On a quarter rather than between two. */
export const isOnQuarter = ({ place }: Sonority): boolean => place % QUARTER_TICKS === 0

export type OnsetState = Readonly<{ exercise: Exercise; before: Sonority | null }>

/** Folds a rule that looks at two onsets in a row, with their places, their lengths and whether they are struck. */
export function onsetPairs<Params>(
  judge: (before: Sonority, now: Sonority, given: Given<Params>) => Breach | null,
): Pick<Rule<OnsetState, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'> {
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
    key: ({ before }) => (before === null ? 0 : packOnset(before)),
    reach: 1,
  }
}

/** An onset's note, place, length and way of beginning as one number; never 0. */
export const packOnset = (onset: Sonority): number =>
  pack(
    [packPitch(onset.note), PITCH_ROOM],
    [Math.floor(onset.place / EIGHTH_TICKS), EIGHTHS_IN_BAR],
    [Math.floor(ticksInBar(onset) / EIGHTH_TICKS), EIGHTHS_IN_BAR + 1],
    [onset.isStruck ? 1 : 0, 2],
  )
