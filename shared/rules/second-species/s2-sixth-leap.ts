import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import { breachAt, lineSpan } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  near: z
    .int()
    .min(1)
    .max(12)
    .default(3)
    .describe('How near the voices must be for it to be needed: 3 for a third. No source gives a number.'),
  octaves: z.boolean().default(true).describe('Octaves are judged as sixths are.'),
})
type Params = z.infer<typeof PARAMS>

export const s2SixthLeap: Rule<NeighbourState, Params> = {
  id: 's2-sixth-leap',
  level: 'preference',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { params }) => {
    const span = lineSpan(before, now)
    if (span !== 5 && !(span === 7 && params.octaves)) return null
    if (before.steps + 1 <= params.near) return null
    return breachAt('unneeded', [before, now], { interval: nameSize(span) }, 'line')
  }),
  explain: {
    title: 'Sixths and octaves only when pressed',
    statement:
      'The line leaps a minor sixth or an octave only where the voices have come too near each other.',
    why: 'So wide a leap is a means of getting out of a corner. Without the corner it is only noise.',
    mends: 'Take a smaller leap, or go by step.',
    sources: cite('FUXN', 'CHER r15', 'GROVE'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 C5:2,C4:2 B4:2,C#5:2 D5', [2]),
    messages: { unneeded: 'The line leaps a {interval} though the voices are not near each other.' },
  },
}
