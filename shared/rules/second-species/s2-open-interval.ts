import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { judgeOpening, openingList, openings, type OpeningState } from '@/shared/rules/first-species/opening'
import { isDissonance } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

const PARAMS = z.strictObject({
  above: openingList(['unison', 'fifth', 'octave'], 'First intervals above the cantus.'),
  below: openingList(['unison', 'octave'], 'First intervals below the cantus.'),
  afterRest: z
    .enum(['perfect', 'consonant'])
    .default('perfect')
    .describe('What may begin after a rest: the same intervals, or any consonance.'),
})
type Params = z.infer<typeof PARAMS>

export const s2OpenInterval: Rule<OpeningState, Params> = {
  id: 's2-open-interval',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  ...openings<Params>((now, { exercise, params }) => {
    if (now.place > 0 && params.afterRest === 'consonant' && !isDissonance(now)) return null
    return judgeOpening(now, exercise.position === 'above' ? params.above : params.below, [])
  }),
  explain: {
    title: 'The first interval',
    statement:
      'The first note that sounds makes a unison, fifth or octave above the cantus, or a unison or octave below it, whether or not a rest comes before it.',
    why: 'The first interval says the mode, also when it comes half a bar late.',
    mends: 'Begin on the final, or above the cantus on its fifth.',
    sources: cite('OMT1', 'GROVE', 'CHER r14', 'LEHM II'),
    disagreement: 'One school book lets any consonance begin when the line enters off the beat.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,F4:2 D5:2,A4:2 B4:2,C#5:2 D5', [1]),
    messages: {
      'not-perfect': 'The line begins a {interval} from the cantus, which is no perfect consonance.',
      'not-allowed': 'The line begins a {interval} from the cantus, which this rule set does not begin with.',
    },
  },
}
