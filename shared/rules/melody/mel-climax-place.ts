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
import { comparePitches, formatPitch } from '@/shared/theory/pitch'

const params = z.strictObject({
  allowPenultimate: z
    .boolean()
    .default(false)
    .describe('Whether the peak may stand in the last bar but one.'),
})
type Params = z.infer<typeof params>

/** The highest note so far, and where it stands too near an end of the line. */
type State = Readonly<{ voice: Voice; peak: Noted | null; misplaced: readonly Noted[] }>

export const melClimaxPlace: Rule<State, Params> = {
  id: 'mel-climax-place',
  level: 'preference',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, peak: null, misplaced: [] }),
  step: (state, moment, { allowPenultimate }) => {
    if (!isNoted(moment)) return goOn(state)
    const { voice, peak } = state
    const order = peak === null ? 1 : comparePitches(moment.note, peak.note)
    if (order < 0) return goOn(state)
    const isMisplaced = moment.isFirst || moment.isLast || (moment.isPenultimate && !allowPenultimate)
    const kept = order > 0 ? [] : state.misplaced
    const misplaced = isMisplaced ? [...kept, moment] : kept
    return goOn({ voice, peak: order > 0 ? moment : peak, misplaced })
  },
  finish: ({ voice, misplaced }, _params, isComplete) => {
    const [first] = misplaced
    if (!isComplete || first === undefined) return null
    return breachAt(voice, 'at-the-edge', misplaced, { note: formatPitch(first.note) })
  },
  key: ({ peak, misplaced }) =>
    pack([packPitch(peak && peak.note), PITCH_ROOM], [misplaced.length > 0 ? 1 : 0, 2]),
  explain: {
    title: 'The peak stands inside',
    statement:
      'The highest note is not in the first bar, nor in the last, nor as a rule in the last but one.',
    why: 'A line needs a way up to its peak and a way home from it.',
    mends: 'Move the highest note inward, or let a bar in the middle rise above it.',
    sources: [{ source: 'GENN' }],
    right: { cantus: 'D4 F4 E4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'A4 F4 E4 D4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [1] },
    messages: {
      'at-the-edge': 'The peak, {note}, stands at the edge of the line; it wants room on both sides.',
    },
    disagreement:
      'Only one course states it exactly, with an exception for lower lines of second and third species whose peak lies below the leading tone.',
  },
}
