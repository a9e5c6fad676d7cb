import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { DOTTED_HALF_TICKS, FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { breachAt, goOn, isNoted } from '@/shared/rules/fold'

import type { Rule } from '@/shared/rules/rule'
import { HALF_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  begins: z
    .enum(['halves', 'downbeat'])
    .default('halves')
    .describe('Where a dotted half begins: on either half of the bar, or on the first quarter alone.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(5, 'D4 F4 E4 D4')

/** Speaks of the whole sounding length: a half tied to a quarter is a dotted half as well. */
export const s5DottedHalf: Rule<null, Params> = {
  id: 's5-dotted-half',
  level: 'preference',
  scope: 'line',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => null,
  step: (state, moment, { begins }) => {
    if (!isNoted(moment) || moment.ticks !== DOTTED_HALF_TICKS || moment.place === 0) return goOn(state)
    if (moment.place !== HALF_TICKS) return { state, breach: breachAt('line', 'weak', [moment]) }
    return { state, breach: begins === 'downbeat' ? breachAt('line', 'second-half', [moment]) : null }
  },
  finish: () => null,
  key: () => 0,
  explain: {
    title: 'Where a dotted half begins',
    statement: 'A dotted half note, or a half tied to a quarter, begins on a strong beat.',
    why: 'So long a note makes an accent of the place it begins on, and the second and fourth quarters are no place for one.',
    mends: 'Begin it on the first or third quarter.',
    sources: cite('RUSH V', 'MINO', 'CHER 5th'),
    disagreement: 'Some mean the first and third quarters by a strong beat, others the first alone.',
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,C5:3 D5:2,C#5:2 D5', [2]),
    messages: {
      weak: 'A dotted half note begins on a weak quarter.',
      'second-half': 'A dotted half note begins in the second half of the bar.',
    },
  },
}
