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
    .describe('Smallest leap that wants an answer, as the number of the interval: 4 is a fourth.'),
  answer: z
    .enum(['step', 'step-or-third', 'opposite'])
    .default('opposite')
    .describe('What answers it, always in the opposite direction: a step; a step or a third; any motion.'),
  excusePenultimate: z
    .boolean()
    .default(false)
    .describe('Excuses a leap into the last note but one, whose answer is the close.'),
})
type Params = z.infer<typeof params>

const LARGEST_ANSWER = { step: 1, 'step-or-third': 2, opposite: Infinity } as const

export const melLeapRecovery: Rule<TwoBehind, Params> = {
  id: 'mel-leap-recovery',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTriples<Params>(
    (first, before, now, { threshold, answer, excusePenultimate }, { voice }) => {
      if (Math.abs(stepsFrom(first.note, before.note)) + 1 < threshold) return null
      if (excusePenultimate && before.isPenultimate) return null
      const isOpposite = directionFrom(before.note, now.note) === -directionFrom(first.note, before.note)
      const isNear = Math.abs(stepsFrom(before.note, now.note)) <= LARGEST_ANSWER[answer]
      if (isOpposite && isNear && stepsFrom(before.note, now.note) !== 0) return null
      return breachAt(voice, answer, [first, before, now], spanArgs(first, before))
    },
    (before, now, { threshold }) => Math.abs(stepsFrom(before.note, now.note)) + 1 >= threshold,
  ),
  explain: {
    title: 'Answer a large leap',
    statement: 'After a large leap the line turns back, best by step.',
    why: 'A leap leaves a gap; turning back fills it, and the line keeps its balance.',
    mends: 'Let the next note step back inside the leap, or make the leap smaller.',
    sources: [
      { source: 'OMT1' },
      { source: 'CFH', place: 'rule 5' },
      { source: 'ECR', place: 'rule 8' },
      { source: 'GENN' },
      { source: 'CCC', place: 'rule 3' },
      { source: 'MANNF' },
      { source: 'HSR', place: 'soft rule 5' },
      { source: 'EX' },
    ],
    right: { cantus: 'D4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 A4 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      step: 'After the {interval} from {from} to {to} the line should step back.',
      'step-or-third':
        'After the {interval} from {from} to {to} the line should turn back by a step or a third.',
      opposite: 'After the {interval} from {from} to {to} the line should turn back.',
    },
    disagreement:
      'How large a leap needs it, and whether only a step will do, differs from book to book; 23 of Fux’s 46 two-voice solutions leave a leap of a fifth or more without a step back.',
  },
}
