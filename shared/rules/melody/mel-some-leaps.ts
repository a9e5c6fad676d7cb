import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  goOn,
  isNoted,
  pack,
  packPitch,
  PITCH_ROOM,
  type Noted,
} from '@/shared/rules/fold'
import type { Moment, Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  least: z.int().min(1).max(10).default(1).describe('Fewest leaps.'),
})
type Params = z.infer<typeof params>

type State = Readonly<{ voice: Voice; first: Moment | null; before: Noted | null; leaps: number }>

export const melSomeLeaps: Rule<State, Params> = {
  id: 'mel-some-leaps',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, first: null, before: null, leaps: 0 }),
  step: (state, moment, { least }) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? { ...state, before: null } : state)
    const { voice, before } = state
    const isLeap = before !== null && Math.abs(stepsFrom(before.note, moment.note)) > 1
    const leaps = Math.min(least, isLeap ? state.leaps + 1 : state.leaps)
    return goOn({ voice, first: state.first ?? moment, before: moment, leaps })
  },
  finish: ({ voice, first, before, leaps }, { least }, isComplete) =>
    isComplete && leaps < least && first !== null && before !== null && first !== before
      ? breachAt(voice, 'too-few', [first, before], { count: leaps, least })
      : null,
  key: ({ before, leaps }) => pack([packPitch(before && before.note), PITCH_ROOM], [leaps, 16]),
  explain: {
    title: 'A leap or two',
    statement: 'A good line contains a few leaps.',
    why: 'A line of steps alone is a scale; a leap gives it a face.',
    mends: 'Open the line with a leap, or leap to the peak and step down from it.',
    sources: [{ source: 'OMT1' }, { source: 'CFH', place: 'rule 5' }],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 F4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [7] },
    messages: { 'too-few': 'The line moves by step only; {least} or more leaps would give it a shape.' },
  },
}
