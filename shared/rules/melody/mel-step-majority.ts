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
import type { Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  percent: z.int().min(1).max(100).default(50).describe('Share of steps among all moves, in per cent.'),
  isInclusive: z.boolean().default(false).describe('Whether just that share is enough, or more is wanted.'),
})
type Params = z.infer<typeof params>

type State = Readonly<{ voice: Voice; before: Noted | null; steps: number; leaps: readonly Noted[] }>

export const melStepMajority: Rule<State, Params> = {
  id: 'mel-step-majority',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, before: null, steps: 0, leaps: [] }),
  step: (state, moment) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? { ...state, before: null } : state)
    const { voice, before, steps, leaps } = state
    const size = before === null ? 0 : Math.abs(stepsFrom(before.note, moment.note))
    return goOn({
      voice,
      before: moment,
      steps: size === 1 ? steps + 1 : steps,
      leaps: size > 1 ? [...leaps, moment] : leaps,
    })
  },
  finish: ({ voice, steps, leaps }, { percent, isInclusive }, isComplete) => {
    if (!isComplete || leaps.length === 0) return null
    const surplus = 100 * steps - percent * (steps + leaps.length)
    if (surplus > 0 || (surplus === 0 && isInclusive)) return null
    return breachAt(voice, 'too-few', leaps, { steps, leaps: leaps.length })
  },
  key: ({ before, steps, leaps }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [steps, 1024], [leaps.length, 1024]),
  explain: {
    title: 'More steps than leaps',
    statement: 'A line moves mostly by step.',
    why: 'Steps are what makes a voice a line; leaps are its accents, and work only when they are few.',
    mends: 'Fill some of the leaps with the notes between.',
    sources: [
      { source: 'HSR', place: 'soft rule 1' },
      { source: 'OMT1' },
      { source: 'ECR', place: 'rule 7' },
      { source: 'RWU' },
      { source: 'EX' },
    ],
    right: { cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 D4 G4 F4 A4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [7] },
    messages: { 'too-few': 'The line has {steps} steps and {leaps} leaps; steps should be in the majority.' },
    disagreement:
      'Sources ask for most moves, or three in five; Fux’s own canti firmi have from 38 to 75 per cent steps.',
  },
}
