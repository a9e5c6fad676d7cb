import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldTriples, spanArgs, type TwoBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { directionFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  threshold: z
    .int()
    .min(3)
    .max(8)
    .default(5)
    .describe('Smallest leap that wants to be prepared, as the number of the interval: 5 is a fifth.'),
  by: z
    .enum(['opposite', 'step'])
    .default('opposite')
    .describe('What prepares it, in the opposite direction: any motion, or a step.'),
})
type Params = z.infer<typeof params>

export const melLeapApproach: Rule<TwoBehind, Params> = {
  id: 'mel-leap-approach',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTriples<Params>((first, before, now, { threshold, by }, { voice }) => {
    if (Math.abs(stepsFrom(before.note, now.note)) + 1 < threshold) return null
    const approach = stepsFrom(first.note, before.note)
    const isOpposite = directionFrom(first.note, before.note) === -directionFrom(before.note, now.note)
    if (isOpposite && (by === 'opposite' || Math.abs(approach) === 1)) return null
    return breachAt(voice, by, [first, before, now], spanArgs(before, now))
  }),
  explain: {
    title: 'Prepare a large leap',
    statement: 'Before a large leap the line moves in the opposite direction.',
    why: 'Drawing back before a leap gives it strength, and keeps the line inside its compass.',
    mends: 'Let the note before the leap be reached from the other side.',
    sources: [
      { source: 'CFH', place: 'rule 5' },
      { source: 'RUSH', place: 'third species' },
      { source: 'HSR', place: 'soft rule 5' },
    ],
    right: { cantus: 'E4 D4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      opposite: 'The {interval} from {from} to {to} is not prepared by motion the other way.',
      step: 'The {interval} from {from} to {to} is not prepared by a step the other way.',
    },
    disagreement: 'Schubert asks for contrary motion before or after, not both.',
  },
}
