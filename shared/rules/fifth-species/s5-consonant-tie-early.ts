import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { breachAt, isDissonance } from '@/shared/rules/first-species/sonority'
import { afterSome, isTiedOver, type AfterState } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { HALF_TICKS, QUARTER_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  earliest: z
    .enum(['second-quarter', 'third-quarter'])
    .default('second-quarter')
    .describe('When a consonant note that was held over may go on.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5ConsonantTieEarly: Rule<AfterState, Params> = {
  id: 's5-consonant-tie-early',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  ...afterSome<Params>(
    (now) => isTiedOver(now) && !isDissonance(now),
    (before, now, { params }) => {
      const earliest = params.earliest === 'second-quarter' ? QUARTER_TICKS : HALF_TICKS
      return now.isStruck && now.place > 0 && now.place < earliest
        ? breachAt('early', [before, now], {}, 'line')
        : null
    },
  ),
  explain: {
    title: 'A consonant tie may move on early',
    statement: 'A note held over that is still consonant may go on from the second quarter.',
    why: 'It has nothing to resolve, so it need not wait for the middle of the bar. It has to be heard for a quarter to count as held.',
    mends: 'Hold the note for a quarter at least.',
    sources: cite('FLASH', 'EX'),
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:0.5,B4:0.5,C5:1,D5:2~ D5:2,C#5:2 D5', [2]),
    messages: { early: 'The note held over is left before it has been held long enough.' },
  },
}
