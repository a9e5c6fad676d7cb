import { z } from 'zod'
import {
  ALL_SPECIES,
  breachAt,
  isNoted,
  pack,
  packPitch,
  PITCH_ROOM,
  type Frame,
  type Noted,
} from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf, isRaisedSeventh } from '@/shared/theory/scale'

const params = z.strictObject({
  where: z
    .enum(['penultimate', 'rising'])
    .default('penultimate')
    .describe(
      'Raised degrees: only for the close, the seventh just before the last note; or wherever they rise by step.',
    ),
})
type Params = z.infer<typeof params>

/**
 * `early` is a raised seventh of the bar under way that was not the last note but one. Where a bar holds many notes it
 * is still in its place if that bar is the last but one, which the next bar tells.
 */
type State = Readonly<{ frame: Frame; before: Noted | null; early: Noted | null }>

const isRaisedSixth = ({ note }: Noted, { exercise: { mode, final } }: Frame): boolean =>
  mode === 'aeolian' && degreeOf(note, final) === 6 && alterationInMode(note, mode, final) === 1

const isSeventh = ({ note }: Noted, { exercise: { mode, final } }: Frame): boolean =>
  isRaisedSeventh(note, mode, final)

const risesByStep = (before: Noted, now: Noted): boolean =>
  isSamePitch(before.note, now.note) || stepsFrom(before.note, now.note) === 1

const say = (frame: Frame, code: string, moments: readonly Noted[]): Breach =>
  breachAt(frame.voice, code, moments, { note: formatPitch((moments[0] as Noted).note) })

const isEarly = (now: Noted, frame: Frame): boolean => isSeventh(now, frame) && !now.isPenultimate

function judge(before: Noted | null, now: Noted, { where }: Params, frame: Frame): Breach | null {
  if (where === 'rising') {
    if (before === null || risesByStep(before, now)) return null
    return isRaisedSixth(before, frame) || isSeventh(before, frame)
      ? say(frame, 'falls', [before, now])
      : null
  }
  if (before !== null && isRaisedSixth(before, frame) && !isSeventh(now, frame)) {
    return say(frame, 'sixth', [before, now])
  }
  if (isEarly(now, frame) && frame.exercise.species === 1) return say(frame, 'seventh', [now])
  return isRaisedSixth(now, frame) && now.isLast ? say(frame, 'sixth', [now]) : null
}

export const melMinorDegrees: Rule<State, Params> = {
  id: 'mel-minor-degrees',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  start: (exercise, _params, voice) => ({ frame: { exercise, voice }, before: null, early: null }),
  step: (state, moment, given) => {
    const { frame, before, early } = state
    const isOver = early !== null && moment.bar !== early.bar
    const late = isOver && !moment.isLast ? say(frame, 'seventh', [early]) : null
    const kept = isOver ? null : early
    if (!isNoted(moment)) {
      const known = moment.note === null ? null : before
      return { state: { frame, before: known, early: kept }, breach: late }
    }
    const breach = late ?? judge(before, moment, given, frame)
    const isWaiting = given.where === 'penultimate' && frame.exercise.species !== 1 && isEarly(moment, frame)
    return { state: { frame, before: moment, early: isWaiting ? (kept ?? moment) : kept }, breach }
  },
  finish: ({ frame, early }, _params, isComplete) =>
    early === null || !isComplete ? null : say(frame, 'seventh', [early]),
  key: ({ before, early }) =>
    pack([packPitch(before && before.note), PITCH_ROOM], [early === null ? 0 : 1, 2]),
  explain: {
    title: 'Raised degrees belong to the close',
    statement: 'The raised seventh appears only at the close, the raised sixth only on the way to it.',
    why: 'The sharpened notes are there to make the half step into the final. Elsewhere they put the mode in doubt.',
    mends: 'Take the natural note, or lead the raised one up to the final.',
    sources: [
      { source: 'OMT1' },
      { source: 'DAVD' },
      { source: 'SOLON' },
      { source: 'LEHM', place: 'lessons II and IV' },
    ],
    right: {
      cantus: 'A3 C4 D4 C4 B3 A3',
      line: 'A4 E4 D4 F#4 G#4 A4',
      mode: 'aeolian',
      final: 'A',
      breaches: [],
    },
    wrong: {
      cantus: 'A3 C4 D4 C4 B3 A3',
      line: 'A4 G#4 F#4 E4 G#4 A4',
      mode: 'aeolian',
      final: 'A',
      breaches: [2, 4],
    },
    messages: {
      seventh: '{note} is the raised seventh; it belongs just before the last note.',
      sixth: '{note} is the raised sixth; it belongs on the way up to the raised seventh.',
      falls: '{note} is raised and wants to rise by step.',
    },
    disagreement:
      'Lehmann raises them freely on the way up; Fux sharpens F two bars before the close in Mixolydian.',
  },
}
