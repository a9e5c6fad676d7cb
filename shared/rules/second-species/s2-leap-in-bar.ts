import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, foldPairs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import { shortExample, steppingExample, STEPPING_LINE } from '@/shared/rules/second-species/examples'
import { stepsFrom } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  from: z
    .int()
    .min(3)
    .max(8)
    .default(3)
    .describe('The smallest leap over the bar line that is told: 3 for a third, 4 for a fourth.'),
})
type Params = z.infer<typeof PARAMS>

export const s2LeapInBar: Rule<OneBehind, Params> = {
  id: 's2-leap-in-bar',
  level: 'preference',
  scope: 'line',
  species: SECOND_SPECIES,
  params: PARAMS,
  ...foldPairs<Params>((before, now, { from }) => {
    const steps = Math.abs(stepsFrom(before.note, now.note))
    if (before.bar === now.bar || steps + 1 < from) return null
    return breachAt('line', 'over-barline', [before, now], { interval: nameSize(steps) })
  }),
  explain: {
    title: 'Leap inside the bar',
    statement: 'Leaps come inside the bar rather than over the bar line.',
    why: 'Over the bar line both voices move; a leap there is twice as bold as one over a note that stands still.',
    mends: 'Step over the bar line, and leap from the first half to the second.',
    sources: cite('OMT1'),
    right: steppingExample(STEPPING_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,A4:2 B4:2,C#5:2 D5', [2]),
    messages: { 'over-barline': 'The line leaps a {interval} over the bar line.' },
  },
}
