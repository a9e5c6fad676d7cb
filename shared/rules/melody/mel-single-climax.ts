import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  goOn,
  isNoted,
  pack,
  packPitch,
  PITCH_ROOM,
  type Frame,
  type Noted,
} from '@/shared/rules/fold'
import type { Moment, Rule } from '@/shared/rules/rule'
import { comparePitches, formatPitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  extreme: z
    .enum(['high', 'low-below', 'either', 'both'])
    .default('high')
    .describe(
      'Which extreme sounds once: the highest note; the highest or, in a line below the cantus, the lowest instead; either in any line; both.',
    ),
})
type Params = z.infer<typeof params>

type State = Readonly<{ frame: Frame; highs: readonly Noted[]; lows: readonly Noted[] }>

/** Takes a note into the list of the most extreme notes; `side` is 1 for the highest, −1 for the lowest. */
function gather(extremes: readonly Noted[], now: Noted, side: 1 | -1): readonly Noted[] {
  const known = extremes[0]
  const order = known === undefined ? 1 : side * comparePitches(now.note, known.note)
  if (order > 0) return [now]
  return order === 0 ? [...extremes, now] : extremes
}

export const melSingleClimax: Rule<State, Params> = {
  id: 'mel-single-climax',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (exercise, _params, voice) => ({ frame: { exercise, voice }, highs: [], lows: [] }),
  step: (state, moment, { extreme }) => {
    if (!isNoted(moment)) return goOn(state)
    const { frame } = state
    const highs = gather(state.highs, moment, 1)
    const lows = extreme === 'high' ? state.lows : gather(state.lows, moment, -1)
    return goOn(highs === state.highs && lows === state.lows ? state : { frame, highs, lows })
  },
  finish: ({ frame, highs, lows }, { extreme }, isComplete) => {
    if (!isComplete) return null
    const say = (code: string, moments: readonly Moment[], note: Noted) =>
      breachAt(frame.voice, code, moments, { note: formatPitch(note.note), count: moments.length })
    const isLowHeard = extreme !== 'high'
    const isEither =
      extreme === 'either' ||
      (extreme === 'low-below' && frame.voice === 'line' && frame.exercise.position === 'below')
    if (highs.length > 1 && !(isEither && lows.length === 1))
      return say('peak-again', highs, highs[0] as Noted)
    if (isLowHeard && extreme === 'both' && lows.length > 1)
      return say('trough-again', lows, lows[0] as Noted)
    return null
  },
  key: ({ highs, lows }) =>
    pack(
      [packPitch(highs[0]?.note ?? null), PITCH_ROOM],
      [highs.length > 1 ? 1 : 0, 2],
      [packPitch(lows[0]?.note ?? null), PITCH_ROOM],
      [lows.length > 1 ? 1 : 0, 2],
    ),
  explain: {
    title: 'One peak, sounded once',
    statement: 'A line has a single peak: its highest note sounds once.',
    why: 'A peak that comes twice is no peak. One highest note gives the whole line a direction, up to it and away from it.',
    mends: 'Lower one of the two, or let one of them climb a step further.',
    sources: [
      { source: 'OMT1' },
      { source: 'CFH', place: 'rule 4' },
      { source: 'GENN' },
      { source: 'ECR', place: 'rule 5' },
      { source: 'HSR', place: 'soft rule 2' },
      { source: 'EX' },
    ],
    right: { cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 A4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [6] },
    messages: {
      'peak-again': 'The highest note, {note}, sounds {count} times; a peak is heard once.',
      'trough-again': 'The lowest note, {note}, sounds {count} times; let it be heard once.',
    },
    disagreement:
      'Law for Open Music Theory, a soft rule elsewhere. All of Fux’s canti firmi keep it; 19 of his 46 counterpoints strike the peak more than once.',
  },
}
