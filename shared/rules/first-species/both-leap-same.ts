import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { FIRST_SPECIES, neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import { breachAt, cantusSpan, lineSpan, sharedDirection } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  max: z.int().min(2).max(8).default(4).describe('The largest leap allowed: 4 for a fourth.'),
  wider: z
    .enum(['either', 'both'])
    .default('either')
    .describe('Told when either leap is wider than that, or only when both are.'),
})
type Params = z.infer<typeof PARAMS>

export const bothLeapSame: Rule<NeighbourState, Params> = {
  id: 'both-leap-same',
  level: 'preference',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { params: { max, wider } }) => {
    if (sharedDirection(before, now) === 0) return null
    const line = lineSpan(before, now)
    const cantus = cantusSpan(before, now)
    if (line < 2 || cantus < 2) return null
    const compared = wider === 'either' ? Math.max(line, cantus) : Math.min(line, cantus)
    return compared + 1 > max ? breachAt('wide', [before, now], { interval: nameSize(max - 1) }) : null
  }),
  explain: {
    title: 'No wide leaps side by side',
    statement: 'When both voices leap the same way, neither leaps wider than a fourth.',
    why: 'Two wide leaps side by side throw the whole music into another register.',
    mends: 'Let the line move against the cantus here, or by step.',
    sources: cite('E2 s1-4f', 'JEPP°', 'EX Fig 37 b5–6'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'F4 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { wide: 'Both voices leap the same way, wider than a {interval}.' },
  },
}
