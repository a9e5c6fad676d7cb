import { z } from 'zod'
import { ALL_SPECIES, breachAt, goOn, isNoted, spanArgs, type Frame } from '@/shared/rules/fold'
import { packExtremes, widen, type Extremes } from '@/shared/rules/melody/extremes'
import type { Breach, Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'
import { comparePitches, formatPitch, parsePitch, type Pitch } from '@/shared/theory/pitch'

const pitchName = z.string().refine((name) => parsePitch(name).ok, 'Not a pitch, such as C4.')

const params = z.strictObject({
  aboveLow: pitchName.default('C4').describe('Lowest note of a line above the cantus.'),
  aboveHigh: pitchName.default('A5').describe('Highest note of a line above the cantus.'),
  belowLow: pitchName.default('D2').describe('Lowest note of a line below the cantus.'),
  belowHigh: pitchName.default('D4').describe('Highest note of a line below the cantus.'),
  span: z
    .int()
    .min(3)
    .max(22)
    .default(22)
    .describe(
      'Widest span of the whole line, as the number of the interval: 10 is a tenth; 22, three octaves, never binds.',
    ),
})
type Params = z.infer<typeof params>

type State = Readonly<{
  frame: Frame
  low: Pitch
  high: Pitch
  extremes: Extremes | null
  isTooWide: boolean
}>

const readPitch = (name: string): Pitch => {
  const parsed = parsePitch(name)
  if (!parsed.ok) throw new RangeError(`Not a pitch: ${name}`)
  return parsed.value
}

function judgeSpan({ voice }: Frame, { low, high }: Extremes, span: number): Breach | null {
  if (stepsFrom(low.note, high.note) + 1 <= span) return null
  return breachAt(voice, 'too-wide', [low, high], { ...spanArgs(low, high), limit: nameSize(span - 1) })
}

export const voiceCompass: Rule<State, Params> = {
  id: 'voice-compass',
  level: 'preference',
  scope: 'line',
  species: ALL_SPECIES,
  params,
  start: (exercise, { aboveLow, aboveHigh, belowLow, belowHigh }, voice) => ({
    frame: { exercise, voice },
    low: readPitch(exercise.position === 'above' ? aboveLow : belowLow),
    high: readPitch(exercise.position === 'above' ? aboveHigh : belowHigh),
    extremes: null,
    isTooWide: false,
  }),
  step: (state, moment, { span }) => {
    if (!isNoted(moment)) return goOn(state)
    const { frame, low, high, isTooWide } = state
    const isBelow = comparePitches(moment.note, low) < 0
    const isAbove = comparePitches(moment.note, high) > 0
    const outside =
      isBelow || isAbove
        ? breachAt(frame.voice, isBelow ? 'below' : 'above', [moment], {
            note: formatPitch(moment.note),
            low: formatPitch(low),
            high: formatPitch(high),
          })
        : null
    if (isTooWide) return { state, breach: outside }
    const extremes = widen(state.extremes, moment)
    // One breach a moment: where this note lies outside as well, the span is told at the next note or at the end.
    const wide = outside === null ? judgeSpan(frame, extremes, span) : null
    return { state: { frame, low, high, extremes, isTooWide: wide !== null }, breach: outside ?? wide }
  },
  finish: ({ frame, extremes, isTooWide }, { span }) =>
    isTooWide || extremes === null ? null : judgeSpan(frame, extremes, span),
  key: ({ extremes, isTooWide }) => (isTooWide ? 1 : 2 + packExtremes(extremes)),
  explain: {
    title: 'A singable compass',
    statement: 'Each line stays where a voice can sing it: within a compass, and within a span.',
    why: 'Species counterpoint is written for voices. Notes at the edge of a voice are loud or faint, and spoil the balance.',
    mends: 'Bring the note into the compass, if need be by moving the phrase an octave.',
    sources: [{ source: 'GENN' }, { source: 'LEHM', place: 'lesson I' }, { source: 'MANNF' }],
    right: { cantus: 'D4 F4 E4 D4', line: 'D5 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: {
      cantus: 'D4 F4 E4 D4',
      line: 'D5 B5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [2],
    },
    messages: {
      below: '{note} lies below the compass of this voice, {low} to {high}.',
      above: '{note} lies above the compass of this voice, {low} to {high}.',
      'too-wide': 'From {from} to {to} is a {interval}; the whole line stays within a {limit}.',
    },
  },
}
