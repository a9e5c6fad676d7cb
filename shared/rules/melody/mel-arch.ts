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
import { packExtremes, EXTREMES_ROOM, type Extremes } from '@/shared/rules/melody/extremes'
import type { Rule, Voice } from '@/shared/rules/rule'
import { comparePitches } from '@/shared/theory/pitch'
import { directionFrom, type Direction } from '@/shared/theory/interval'

const params = z.strictObject({
  turns: z
    .int()
    .min(2)
    .max(12)
    .default(4)
    .describe(
      'Most turns on neighbouring notes. No published number; Fux’s canti firmi have at most four, so the fifth is told.',
    ),
})
type Params = z.infer<typeof params>

type State = Readonly<{
  voice: Voice
  before: Noted | null
  direction: Direction
  /** Notes in a row at which the line has turned, counted no further than one more than allowed. */
  turns: number
  /** The first of those notes. */
  turnedAt: Noted | null
  extremes: Extremes | null
  /** Whether the highest note stands somewhere inside the line, and whether the lowest does. */
  isHighInside: boolean
  isLowInside: boolean
}>

function place(state: State, now: Noted): Pick<State, 'extremes' | 'isHighInside' | 'isLowInside'> {
  const isInside = !now.isFirst && !now.isLast
  const { extremes } = state
  if (extremes === null) {
    return { extremes: { low: now, high: now }, isHighInside: isInside, isLowInside: isInside }
  }
  const { low, high } = extremes
  const overHigh = comparePitches(now.note, high.note)
  const overLow = comparePitches(now.note, low.note)
  const isNew = overHigh > 0 || overLow < 0
  return {
    extremes: isNew ? { low: overLow < 0 ? now : low, high: overHigh > 0 ? now : high } : extremes,
    isHighInside: overHigh > 0 ? isInside : state.isHighInside || (overHigh === 0 && isInside),
    isLowInside: overLow < 0 ? isInside : state.isLowInside || (overLow === 0 && isInside),
  }
}

export const melArch: Rule<State, Params> = {
  id: 'mel-arch',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({
    voice,
    before: null,
    direction: 0,
    turns: 0,
    turnedAt: null,
    extremes: null,
    isHighInside: false,
    isLowInside: false,
  }),
  step: (state, moment, { turns: most }) => {
    const { voice, before } = state
    if (!isNoted(moment)) {
      if (moment.note === 'rest') return goOn(state)
      return goOn({ ...state, before: null, direction: 0 as const, turns: 0, turnedAt: null })
    }
    const shape = place(state, moment)
    const direction = before === null ? 0 : directionFrom(before.note, moment.note)
    const hasTurned = direction !== 0 && state.direction !== 0 && direction !== state.direction
    const turns = hasTurned ? Math.min(state.turns + 1, most + 1) : 0
    const turnedAt = hasTurned ? (state.turnedAt ?? before) : null
    const isNew = turns === most + 1 && state.turns === most
    return {
      state: { voice, before: moment, direction, turns, turnedAt, ...shape },
      breach:
        isNew && turnedAt !== null
          ? breachAt(voice, 'zigzag', [turnedAt, moment], { count: turns, most })
          : null,
    }
  },
  finish: ({ voice, extremes, isHighInside, isLowInside }, _params, isComplete) => {
    if (!isComplete || extremes === null || isHighInside || isLowInside) return null
    return breachAt(voice, 'no-arch', [extremes.low, extremes.high])
  },
  key: ({ before, direction, turns, extremes, isHighInside, isLowInside }) =>
    pack(
      [packPitch(before && before.note), PITCH_ROOM],
      [direction + 1, 3],
      [turns, 16],
      [packExtremes(extremes), EXTREMES_ROOM],
      [isHighInside ? 1 : 0, 2],
      [isLowInside ? 1 : 0, 2],
    ),
  explain: {
    title: 'One arch',
    statement:
      'The line makes one shape: it rises to a peak and falls to the close, or the other way round, without aimless turns.',
    why: 'A line with one aim is remembered; one that turns at every note is only a row of notes.',
    mends: 'Let two or three notes go the same way, and put the turn inside the line.',
    sources: [{ source: 'OMT1' }, { source: 'CFH', place: 'rule 1' }],
    right: { cantus: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: {
      cantus: 'D4 F4 E4 G4 F4 A4 G4 F4 E4 D4',
      mode: 'dorian',
      final: 'D',
      params: { turns: 3 },
      breaches: [6],
    },
    messages: {
      zigzag: 'The line turns on {count} notes in a row; let it go somewhere first.',
      'no-arch': 'The line has its highest and its lowest note at its ends; it wants a peak inside.',
    },
    disagreement: 'No source gives a number of turns; the limit here is this catalogue’s own.',
  },
}
