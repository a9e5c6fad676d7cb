import { z } from 'zod'
import type { Given } from '@/shared/rules/first-species/folds'
import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import {
  breachAt,
  degreeIn,
  isDissonance,
  nameOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, packPitch } from '@/shared/rules/fold'
import type { Breach, Exercise, Rule } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'

export const CADENCE_PARAMS = z.strictObject({
  first: z
    .enum(['formula', 'fifth', 'free'])
    .default('formula')
    .describe(
      'How the last bar but one begins: by the formula of the position and mode; always on a fifth; freely.',
    ),
  last: z
    .enum(['formula', 'consonant'])
    .default('formula')
    .describe('What comes before the close: the sixth or third of the formula, or any consonance.'),
})
export type CadenceParams = z.infer<typeof CADENCE_PARAMS>

export type CadenceState = Readonly<{ exercise: Exercise; downbeat: Sonority | null }>

/** Folds a rule of the last bar but one, in one position, together with the downbeat it began with. */
export const cadence = (
  position: Exercise['position'],
): Pick<Rule<CadenceState, CadenceParams>, 'start' | 'step' | 'finish' | 'key'> => ({
  start: (exercise) => ({ exercise, downbeat: null }),
  step: ({ exercise, downbeat }, moment, params) => {
    if (exercise.position !== position) return goOn({ exercise, downbeat })
    const now = sonorityOf(moment)
    const first = moment.place === 0 ? now : downbeat
    const isJudged = now !== null && moment.isPenultimate
    return {
      state: { exercise, downbeat: first },
      breach: isJudged ? judge(first, now, { exercise, params, moment }) : null,
    }
  },
  finish: () => null,
  key: ({ downbeat }) => packPitch(downbeat && downbeat.note),
})

function judge(
  first: Sonority | null,
  now: Sonority,
  { exercise, params }: Given<CadenceParams>,
): Breach | null {
  const breach = judgeLast(now, exercise, params)
  if (breach !== null || first === null) return breach
  const isWhole = now.place === 0 && now.ticks >= WHOLE_TICKS
  if (isWhole || params.first === 'free') return null
  // The sources speak of a cantus that comes down to its final; coming up it has no formula for the first half.
  if (params.first === 'formula' && degreeIn(now.other, exercise) !== 2) return null
  const isSixthAsked =
    params.first === 'formula' && exercise.mode === 'phrygian' && exercise.position === 'below'
  const isGood = isSixthAsked
    ? first.simpleSteps === 5 && first.simpleSemitones === 8
    : first.simpleSteps === 4 && first.simpleSemitones === 7
  const args = { interval: nameOf(first) }
  return isGood ? null : breachAt(isSixthAsked ? 'no-sixth' : 'no-fifth', [first, now], args)
}

function judgeLast(now: Sonority, exercise: Exercise, { last }: CadenceParams): Breach | null {
  if (last === 'formula') return judgePenultimate(now, exercise)
  return isDissonance(now) ? breachAt('dissonant', [now], { interval: nameOf(now) }) : null
}
