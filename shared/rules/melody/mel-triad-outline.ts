import { z } from 'zod'
import { ALL_SPECIES, breachAt, goOn, isNoted, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import { isLetterTriad } from '@/shared/rules/melody/letter-triad'
import type { Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  most: z.int().min(2).max(3).default(2).describe('Most notes of one triad in a row by leap.'),
})
type Params = z.infer<typeof params>

/** The last notes that were joined by leaps, newest last: at most as many as are allowed. */
type State = Readonly<{ voice: Voice; leapt: readonly Noted[] }>

export const melTriadOutline: Rule<State, Params> = {
  id: 'mel-triad-outline',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, leapt: [] }),
  step: ({ voice, leapt }, moment, { most }) => {
    if (!isNoted(moment)) return goOn({ voice, leapt: moment.note === null ? [] : leapt })
    const before = leapt.at(-1)
    if (before === undefined || Math.abs(stepsFrom(before.note, moment.note)) < 2) {
      return goOn({ voice, leapt: [moment] })
    }
    const notes = [...leapt, moment]
    const isOutline = notes.length > most && isLetterTriad(notes.map(({ note }) => note))
    return {
      state: { voice, leapt: notes.slice(-most) },
      breach: isOutline ? breachAt(voice, 'triad', notes, { count: notes.length, most }) : null,
    }
  },
  finish: () => null,
  key: ({ leapt }) => leapt.reduce((key, { note }) => key * PITCH_ROOM + packPitch(note), 0),
  reach: 3,
  explain: {
    title: 'No broken chords',
    statement: 'The notes of one triad do not follow each other by leap.',
    why: 'Three notes of a chord in a row are heard as the chord; the line stops being a line.',
    mends: 'Fill one of the leaps with a step.',
    sources: [
      { source: 'LEHM', place: 'lesson II' },
      { source: 'E2' },
      { source: 'BRIDGE', place: 'ch. 2, rule 10' },
      { source: 'CFH', place: 'rule 6' },
    ],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { triad: '{count} notes in a row spell one triad by leap.' },
    disagreement:
      'One handout demands a triad where two leaps go one way; Bridge and the texts on the sixteenth century discourage it.',
  },
}
