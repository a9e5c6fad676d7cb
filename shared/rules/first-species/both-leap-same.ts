import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import { breachAt, cantusSpan, lineSpan, sharedDirection } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  from: z
    .int()
    .min(3)
    .max(8)
    .default(4)
    .describe('The smallest interval that counts as a leap here, in both voices: 4 for a fourth.'),
  max: z.int().min(2).max(8).default(4).describe('The widest leap allowed: 4 for a fourth.'),
})
type Params = z.infer<typeof PARAMS>

/**
 * Thirds do not count by default: so read, Fux departs from it once in his forty-six examples (figure 37, bars 5–6);
 * with thirds he would in figures 11 and 13 as well.
 */
export const bothLeapSame: Rule<NeighbourState, Params> = {
  id: 'both-leap-same',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { params: { from, max } }) => {
    if (sharedDirection(before, now) === 0) return null
    const line = lineSpan(before, now)
    const cantus = cantusSpan(before, now)
    if (Math.min(line, cantus) + 1 < from || Math.max(line, cantus) + 1 <= max) return null
    return breachAt('wide', [before, now], { limit: nameSize(max - 1) })
  }),
  explain: {
    title: 'No wide leaps side by side',
    statement: 'When both voices leap the same way, neither leaps wider than a fourth.',
    why: 'Two wide leaps side by side throw the whole music into another register.',
    mends: 'Let the line move against the cantus here, or by step.',
    sources: cite('E2 s1-4f', 'JEPP°', 'EX Fig 37 b5–6'),
    right: { cantus: 'D4 G4 F4 E4 D4', line: 'A4 B4 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 G4 F4 E4 D4', line: 'A4 E5 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { wide: 'Both voices leap the same way, one of them wider than a {limit}.' },
  },
}
