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
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  strikes: z
    .int()
    .min(2)
    .max(6)
    .default(3)
    .describe(
      'How often the line may strike one note, leaving it by step and coming straight back, before it is told.',
    ),
})
type Params = z.infer<typeof params>

/** Each of the last two notes, with how many times the line has come straight back to it and where that began. */
type Strike = Readonly<{ at: Noted; from: Noted; returns: number }>
type State = Readonly<{ voice: Voice; older: Strike | null; newer: Strike | null }>

export const melCircling: Rule<State, Params> = {
  id: 'mel-circling',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, older: null, newer: null }),
  step: (state, moment, { strikes }) => {
    const { voice, older, newer } = state
    if (!isNoted(moment)) return goOn(moment.note === null ? { voice, older: null, newer: null } : state)
    const comesBack =
      older !== null &&
      newer !== null &&
      isSamePitch(older.at.note, moment.note) &&
      Math.abs(stepsFrom(newer.at.note, moment.note)) === 1
    const strike: Strike = comesBack
      ? { at: moment, from: older.from, returns: Math.min(older.returns + 1, strikes) }
      : { at: moment, from: moment, returns: 0 }
    const isNew = comesBack && older.returns === strikes - 2
    const breach = isNew
      ? breachAt(voice, 'hovers', [strike.from, moment], { note: formatPitch(moment.note), count: strikes })
      : null
    return { state: { voice, older: newer, newer: strike }, breach }
  },
  finish: () => null,
  key: ({ older, newer }) =>
    pack(
      [packPitch(older && older.at.note), PITCH_ROOM],
      [older ? older.returns : 0, 8],
      [packPitch(newer && newer.at.note), PITCH_ROOM],
      [newer ? newer.returns : 0, 8],
    ),
  explain: {
    title: 'No hovering',
    statement: 'A line does not hover round one note, leaving it by step and coming back again and again.',
    why: 'It is heard as a slow trill: much motion, and no way made.',
    mends: 'After the first return, move on.',
    sources: [{ source: 'HSR', place: 'soft rule 2' }, { source: 'DAVD' }],
    right: { cantus: 'D4 F4 E4 F4 G4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 F4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [6] },
    messages: { hovers: 'The line comes back to {note} {count} times over; it hovers.' },
  },
}
