import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldPairs, spanArgs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  direction: z
    .enum(['above', 'either'])
    .default('either')
    .describe('From which side the last note may be reached.'),
})
type Params = z.infer<typeof params>

export const cfApproachFinal: Rule<OneBehind, Params> = {
  id: 'cf-approach-final',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, { direction }, { voice }) => {
    if (!now.isLast) return null
    const steps = stepsFrom(before.note, now.note)
    if (Math.abs(steps) !== 1) return breachAt(voice, 'not-by-step', [before, now], spanArgs(before, now))
    if (steps === 1 && direction === 'above') {
      return breachAt(voice, 'from-below', [before, now], spanArgs(before, now))
    }
    return null
  }),
  explain: {
    title: 'Reach the last note by step',
    statement: 'The last note of the cantus is reached by step, as a rule from above.',
    why: 'A step into the final is the calmest close a single line has, and it leaves the other voice the leading tone.',
    mends: 'Put the second degree before the final.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'CFH', place: 'rule 2' },
      { source: 'ECR', place: 'rule 4' },
      { source: 'EX', place: 'all of Fux’s canti firmi descend to the final' },
    ],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 F4 D4', mode: 'dorian', final: 'D', breaches: [4] },
    messages: {
      'not-by-step': 'The last note is reached by a {interval}, {from} to {to}; it wants a step.',
      'from-below': 'The last note is reached from below, {from} to {to}; here it wants the step from above.',
    },
    disagreement: 'One handout allows only the step from above; Open Music Theory also allows seven to one.',
  },
}
