import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import { breachAt, lineSpan, sharedDirection } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  from: z
    .int()
    .min(3)
    .max(8)
    .default(3)
    .describe('The smallest leap that is told: 3 for a third, 4 for a fourth.'),
})
type Params = z.infer<typeof PARAMS>

export const similarLeap: Rule<NeighbourState, Params> = {
  id: 'similar-leap',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { params }) => {
    const span = lineSpan(before, now)
    if (span + 1 < params.from || sharedDirection(before, now) === 0) return null
    return breachAt('leaps', [before, now], { interval: nameSize(span) })
  }),
  explain: {
    title: 'Leap against the cantus',
    statement: 'The line avoids leaps while both voices move the same way.',
    why: 'A leap is bold; with the cantus going the same way the whole music lurches.',
    mends: 'Step here, or leap where the cantus goes the other way or stays near.',
    sources: cite('OMT1', 'E2'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { leaps: 'The line leaps a {interval} in the same direction as the cantus.' },
  },
}
