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
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'
import { isFinal, isLeadingTone } from '@/shared/theory/scale'

const params = z.strictObject({
  excuseDescent: z
    .boolean()
    .default(false)
    .describe('Lets the leading tone go on down when the line has come down to it from the final.'),
})
type Params = z.infer<typeof params>

type State = Readonly<{ frame: Frame; before: Noted | null; isDescending: boolean }>

/** A half step under the final. Phrygian has a whole tone there, and so no leading tone of this kind. */
const leads = ({ note }: Noted, { exercise: { mode, final } }: Frame): boolean =>
  mode !== 'phrygian' && isLeadingTone(note, mode, final)

export const melLeadingTone: Rule<State, Params> = {
  id: 'mel-leading-tone',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (exercise, _params, voice) => ({ frame: { exercise, voice }, before: null, isDescending: false }),
  step: (state, moment, { excuseDescent }) => {
    const { frame, before } = state
    if (!isNoted(moment)) {
      // What the unwritten note was is unknown: it may have been the final.
      return goOn(moment.note === null ? { frame, before: null, isDescending: true } : state)
    }
    const { final } = frame.exercise
    if (before === null) return goOn({ ...state, before: moment })
    if (!leads(before, frame)) {
      const isDescending = isFinal(before.note, final) && stepsFrom(before.note, moment.note) === -1
      return goOn({ frame, before: moment, isDescending })
    }
    if (isSamePitch(before.note, moment.note)) return goOn({ ...state, before: moment })
    const step = stepsFrom(before.note, moment.note)
    const resolves = step === 1 && isFinal(moment.note, final)
    const isExcused = excuseDescent && state.isDescending && step === -1
    const breach =
      resolves || isExcused
        ? null
        : breachAt(frame.voice, 'unresolved', [before, moment], {
            leading: formatPitch(before.note),
            to: formatPitch(moment.note),
          })
    return { state: { frame, before: moment, isDescending: false }, breach }
  },
  finish: () => null,
  key: ({ before, isDescending }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [isDescending ? 1 : 0, 2]),
  explain: {
    title: 'The leading tone leads',
    statement: 'The note a half step below the final moves up to the final.',
    why: 'The half step is heard as a promise of the final; going elsewhere breaks it.',
    mends: 'Go to the final next, or take another note before.',
    sources: [{ source: 'OMT1' }],
    right: { cantus: 'C4 D4 E4 D4 B3 C4', mode: 'ionian', final: 'C', breaches: [] },
    wrong: { cantus: 'C4 B3 A3 B3 C4', mode: 'ionian', final: 'C', breaches: [3] },
    messages: {
      unresolved: '{leading} is the leading tone and wants to rise to the final; it goes to {to}.',
    },
    disagreement:
      'Only Open Music Theory states it for the whole line; older books speak of it at the close.',
  },
}
