import { goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Breach, Rule, Voice } from '@/shared/rules/rule'
import { directionFrom, type Direction } from '@/shared/theory/interval'
import { isSamePitch } from '@/shared/theory/pitch'

/**
 * The run in one direction that is under way. `turn` is the turning point it started from, or `null` when an unwritten
 * bar lies before it, so that nobody knows where it started. `last` is its last note; a repeated note counts once,
 * at its last place.
 */
export type Outline = Readonly<{
  voice: Voice
  turn: Noted | null
  last: Noted | null
  direction: Direction
  isFromStart: boolean
}>

type Judge<Params> = (from: Noted, to: Noted, params: Params, voice: Voice) => Breach | null

/** A rule of the intervals between neighbouring turning points of a line; its first and last notes are turning points. */
export const foldTurningPoints = <Params>(
  judge: Judge<Params>,
): Pick<Rule<Outline, Params>, 'start' | 'step' | 'finish' | 'key'> => ({
  start: (_exercise, _params, voice) => ({ voice, turn: null, last: null, direction: 0, isFromStart: true }),
  step: (state, moment, params) => {
    const { voice, turn, last, isFromStart } = state
    if (!isNoted(moment)) {
      return goOn(
        moment.note === null
          ? { voice, turn: null, last: null, direction: 0 as const, isFromStart: false }
          : state,
      )
    }
    if (last === null) {
      return goOn({ ...state, turn: isFromStart ? moment : null, last: moment, isFromStart: false })
    }
    if (isSamePitch(last.note, moment.note)) {
      // Before the line has moved, the first group of repeated notes is itself the turning point.
      const isStill = state.direction === 0
      return goOn({ ...state, last: moment, turn: isStill && turn !== null ? moment : turn })
    }
    const direction = directionFrom(last.note, moment.note)
    const hasTurned = state.direction !== 0 && direction !== state.direction
    const breach = hasTurned && turn !== null ? judge(turn, last, params, voice) : null
    return {
      state: { voice, turn: hasTurned ? last : turn, last: moment, direction, isFromStart: false },
      breach,
    }
  },
  finish: ({ voice, turn, last }, params) =>
    turn !== null && last !== null && last.isLast && turn !== last ? judge(turn, last, params, voice) : null,
  key: ({ turn, last, direction, isFromStart }) =>
    pack(
      [packPitch(turn && turn.note), PITCH_ROOM],
      [packPitch(last && last.note), PITCH_ROOM],
      [direction + 1, 3],
      [isFromStart ? 1 : 0, 2],
    ),
})
