import { z } from 'zod'
import { ALL_SPECIES, breachAt, goOn, isNoted, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Rule, Voice } from '@/shared/rules/rule'
import { isSamePitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  notes: z.int().min(3).max(4).default(3).describe('Notes that make a figure.'),
})
type Params = z.infer<typeof params>

/** How far back a figure is remembered, in notes. A fold must forget; what lies further back is no longer compared. */
const MEMORY_NOTES = 4

/** The last notes, newest last, and for each distance from 3 notes back how many notes in a row have come again. */
type State = Readonly<{ voice: Voice; notes: readonly Noted[]; matches: readonly number[] }>

const DISTANCES = [3, 4] as const

export const melMotiveRepeat: Rule<State, Params> = {
  id: 'mel-motive-repeat',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, notes: [], matches: [0, 0] }),
  step: (state, moment, { notes: length }) => {
    const { voice, notes } = state
    if (!isNoted(moment)) return goOn(moment.note === null ? { voice, notes: [], matches: [0, 0] } : state)
    const matches = DISTANCES.map((distance, index) => {
      const earlier = notes[notes.length - distance]
      if (earlier === undefined || !isSamePitch(earlier.note, moment.note)) return 0
      return Math.min((state.matches[index] as number) + 1, length + 1)
    })
    const isAgain = matches.some((count, index) => count === length && state.matches[index] === length - 1)
    const kept = notes.length < MEMORY_NOTES ? notes : notes.slice(1)
    const breach = isAgain
      ? breachAt(voice, 'again', [...notes.slice(1 - length), moment], { count: length })
      : null
    return { state: { voice, notes: [...kept, moment], matches }, breach }
  },
  finish: () => null,
  key: ({ notes, matches }) => {
    let key = notes.length
    for (const { note } of notes) key = key * PITCH_ROOM + packPitch(note)
    for (const count of matches) key = key * 6 + count
    return key
  },
  explain: {
    title: 'No figure twice',
    statement: 'A figure or group of notes is not repeated at once.',
    why: 'A cantus or a counterpoint is one long line; a repeated figure cuts it into pieces.',
    mends: 'Change a note of the second statement, or lead it somewhere else.',
    sources: [{ source: 'OMT1' }, { source: 'CFH', place: 'rule 7' }, { source: 'HSR' }],
    right: { cantus: 'D4 F4 E4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 G4 E4 F4 G4 E4 D4', mode: 'dorian', final: 'D', breaches: [7] },
    messages: { again: 'The same {count} notes come again; let the line go somewhere new.' },
    disagreement: 'One handout reports that other authors question the rule.',
  },
}
