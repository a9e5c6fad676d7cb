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
import { isSamePitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  notes: z.int().min(3).max(4).default(3).describe('Notes that make a figure.'),
})
type Params = z.infer<typeof params>

/**
 * The last four notes, newest first, and how many notes in a row have been the same as three and as four notes before.
 * A fold must forget: what lies further back is no longer compared.
 */
type State = Readonly<{
  voice: Voice
  one: Noted | null
  two: Noted | null
  three: Noted | null
  four: Noted | null
  matchesOfThree: number
  matchesOfFour: number
}>

const forget = (voice: Voice): State => ({
  voice,
  one: null,
  two: null,
  three: null,
  four: null,
  matchesOfThree: 0,
  matchesOfFour: 0,
})

/** Counts no further than one more than makes a figure, which is then told once. */
const countMatch = (earlier: Noted | null, now: Noted, count: number, length: number): number =>
  earlier !== null && isSamePitch(earlier.note, now.note) ? Math.min(count + 1, length + 1) : 0

export const melMotiveRepeat: Rule<State, Params> = {
  id: 'mel-motive-repeat',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => forget(voice),
  step: (state, now, { notes: length }) => {
    const { voice, one, two, three, four } = state
    if (!isNoted(now)) return goOn(now.note === null ? forget(voice) : state)
    const matchesOfThree = countMatch(three, now, state.matchesOfThree, length)
    const matchesOfFour = countMatch(four, now, state.matchesOfFour, length)
    const isAgain =
      (matchesOfThree === length && state.matchesOfThree === length - 1) ||
      (matchesOfFour === length && state.matchesOfFour === length - 1)
    const figure = isAgain ? [three, two, one].slice(4 - length).filter((noted) => noted !== null) : []
    return {
      state: { voice, one: now, two: one, three: two, four: three, matchesOfThree, matchesOfFour },
      breach: isAgain ? breachAt(voice, 'again', [...figure, now], { count: length }) : null,
    }
  },
  finish: () => null,
  key: ({ one, two, three, four, matchesOfThree, matchesOfFour }) =>
    pack(
      [packPitch(one && one.note), PITCH_ROOM],
      [packPitch(two && two.note), PITCH_ROOM],
      [packPitch(three && three.note), PITCH_ROOM],
      [packPitch(four && four.note), PITCH_ROOM],
      [matchesOfThree, 6],
      [matchesOfFour, 6],
    ),
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
