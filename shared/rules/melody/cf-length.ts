import { z } from 'zod'
import { ALL_SPECIES, breachAt, pack } from '@/shared/rules/fold'
import type { Moment, Rule, Voice } from '@/shared/rules/rule'

const params = z.strictObject({
  least: z.int().min(3).max(40).default(8).describe('Fewest notes.'),
  most: z.int().min(3).max(40).default(16).describe('Most notes.'),
})
type Params = z.infer<typeof params>

type State = Readonly<{ voice: Voice; count: number; last: Moment | null; beyond: readonly Moment[] }>

export const cfLength: Rule<State, Params> = {
  id: 'cf-length',
  level: 'preference',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, count: 0, last: null, beyond: [] }),
  step: ({ voice, count, beyond }, moment, { most }) => ({
    state: {
      voice,
      count: count + 1,
      last: moment,
      beyond: count >= most ? [...beyond, moment] : beyond,
    },
    breach: null,
  }),
  finish: ({ voice, count, last, beyond }, { least, most }, isComplete) => {
    if (beyond.length > 0) return breachAt(voice, 'too-long', beyond, { count, most })
    if (count >= least || last === null || !isComplete) return null
    return breachAt(voice, 'too-short', [last], { count, least })
  },
  key: ({ count, beyond }) => pack([count, 64], [beyond.length > 0 ? 1 : 0, 2]),
  explain: {
    title: 'A cantus of moderate length',
    statement: 'A cantus firmus has a moderate number of notes, by most accounts eight to sixteen.',
    why: 'A shorter line has no room for a rise, a peak and a close; a longer one cannot be held in the ear as one breath.',
    mends:
      'Lengthen the line by giving the rise or the descent more steps, or cut a detour that does not lead anywhere.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'VIGIL' },
      { source: 'CFH', place: 'rule 1' },
      { source: 'ECR', place: 'rule 2' },
      { source: 'EX', place: 'Fux writes 9 to 14 notes' },
    ],
    right: { cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [6] },
    messages: {
      'too-short': 'This cantus has {count} notes; a line of at least {least} has room for a shape.',
      'too-long': 'This cantus has {count} notes; beyond {most} it can no longer be heard as one line.',
    },
  },
}
