import { packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Breach, Exercise, Moment, Rule, Species, Voice } from '@/shared/rules/rule'
import {
  directionFrom,
  intervalBetween,
  simpleInterval,
  type Direction,
  type Interval,
} from '@/shared/theory/interval'
import { comparePitches, type Pitch } from '@/shared/theory/pitch'

/** Rules of three voices govern no species of two. */
export const THREE_VOICES: ReadonlySet<Species> = new Set()

/** A moment at which all three voices sound. */
export type Chord = Readonly<{
  bar: number
  /** By voice, so that motion can be followed: cantus, first line, second line. */
  voices: readonly [cantus: Pitch, line: Pitch, second: Pitch]
  /** From the lowest up, whoever sings it. */
  bass: Pitch
  middle: Pitch
  top: Pitch
  /** What the two upper notes make with the bass, without octaves. */
  overBass: readonly [Interval, Interval]
  isFirst: boolean
  isPenultimate: boolean
  isLast: boolean
}>

const VOICES: readonly Voice[] = ['cantus', 'line', 'second']
/** The voices two by two, by their places in a chord. */
export const PAIRS = [
  [0, 1],
  [0, 2],
  [1, 2],
] as const
export type Pair = (typeof PAIRS)[number]

export function chordOf({ bar, note, other, third, isFirst, isPenultimate, isLast }: Moment): Chord | null {
  if (note === null || note === 'rest' || other === null) return null
  if (third === null || third === undefined || third === 'rest') return null
  const [bass, middle, top] = [note, other, third].sort(comparePitches) as [Pitch, Pitch, Pitch]
  const overBass = [middle, top].map((pitch) => simpleInterval(intervalBetween(bass, pitch)))
  return {
    bar,
    voices: [other, note, third],
    bass,
    middle,
    top,
    overBass: overBass as [Interval, Interval],
    isFirst,
    isPenultimate,
    isLast,
  }
}

export const pairInterval = ({ voices }: Chord, [a, b]: Pair): Interval =>
  intervalBetween(voices[a], voices[b])

export type PerfectKind = 'octave' | 'fifth'

export function perfectKind(interval: Interval): PerfectKind | null {
  const { steps, semitones } = simpleInterval(interval)
  if (steps === 0 && semitones === 0) return 'octave'
  return steps === 4 && semitones === 7 ? 'fifth' : null
}

export const moveOf = (before: Chord, now: Chord, voice: 0 | 1 | 2): Direction =>
  directionFrom(before.voices[voice], now.voices[voice])

/** The direction both voices of a pair take together, or 0. */
export function sharedMove(before: Chord, now: Chord, [a, b]: Pair): Direction {
  const move = moveOf(before, now, a)
  return move === moveOf(before, now, b) ? move : 0
}

/** A breach that points at some voices of some chords, at all of them when left out. */
export const breachAt = (
  code: string,
  chords: readonly Chord[],
  args: Breach['args'] = {},
  places: readonly number[] = [0, 1, 2],
): Breach => ({
  code,
  bars: chords.map(({ bar }) => bar),
  notes: chords.flatMap(({ bar }) =>
    places.map((place) => ({ voice: VOICES[place] as Voice, bar, place: 0 })),
  ),
  args,
})

export type Given<Params> = Readonly<{ exercise: Exercise; params: Params }>
type Fold<State, Params> = Pick<Rule<State, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'>

/** Folds a rule that looks at each chord by itself. */
export const eachChord = <Params>(
  judge: (now: Chord, given: Given<Params>) => Breach | null,
): Fold<Exercise, Params> => ({
  start: (exercise) => exercise,
  step: (exercise, moment, params) => {
    const now = chordOf(moment)
    return { state: exercise, breach: now && judge(now, { exercise, params }) }
  },
  finish: () => null,
  key: () => 0,
  reach: 0,
})

export type ChordState = Readonly<{ exercise: Exercise; before: Chord | null }>

/** Folds a rule that looks at two chords in a row. */
export const chordPairs = <Params>(
  judge: (before: Chord, now: Chord, given: Given<Params>) => Breach | null,
): Fold<ChordState, Params> => ({
  start: (exercise) => ({ exercise, before: null }),
  step: ({ exercise, before }, moment, params) => {
    const now = chordOf(moment)
    return {
      state: { exercise, before: now },
      breach: before && now && judge(before, now, { exercise, params }),
    }
  },
  finish: () => null,
  key: ({ before }) =>
    before === null ? 0 : packPitch(before.voices[1]) * PITCH_ROOM + packPitch(before.voices[2]),
  reach: 1,
})
