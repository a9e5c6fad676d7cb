import type { Breach, Exercise, Moment, Position } from '@/shared/rules/rule'
import {
  directionFrom,
  isPerfectConsonance,
  semitonesFrom,
  stepsFrom,
  type Direction,
} from '@/shared/theory/interval'
import { nameInterval, nameSize } from '@/shared/theory/interval-name'
import { comparePitches, type Pitch } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf, type Degree } from '@/shared/theory/scale'

/** Both voices at one moment, both sounding, and the interval between them whichever is the higher. */
export type Sonority = Readonly<{
  bar: number
  place: number
  note: Pitch
  other: Pitch
  steps: number
  semitones: number
  /** The interval without its octaves. */
  simpleSteps: number
  simpleSemitones: number
}>

/** Two kinds of perfect consonance: octaves count with unisons, twelfths with fifths. */
export type PerfectKind = 'octave' | 'fifth'

/** A moment is read by some thirty rules; the sonority in it is worked out once. */
const known = new WeakMap<Moment, Sonority>()

/** Both voices of a moment, or `null` when the line rests there or is not written yet. */
export function sonorityOf(moment: Moment): Sonority | null {
  const { note, other } = moment
  if (note === null || note === 'rest' || other === null) return null
  const found = known.get(moment)
  if (found) return found
  const isNoteHigher = comparePitches(note, other) >= 0
  const steps = isNoteHigher ? stepsFrom(other, note) : stepsFrom(note, other)
  const semitones = isNoteHigher ? semitonesFrom(other, note) : semitonesFrom(note, other)
  const octaves = Math.floor(steps / 7)
  const sonority: Sonority = {
    bar: moment.bar,
    place: moment.place,
    note,
    other,
    steps,
    semitones,
    simpleSteps: steps - 7 * octaves,
    simpleSemitones: semitones - 12 * octaves,
  }
  known.set(moment, sonority)
  return sonority
}

export function perfectKindOf(sonority: Sonority): PerfectKind | null {
  if (!isPerfectConsonance(sonority)) return null
  return sonority.simpleSteps === 0 ? 'octave' : 'fifth'
}

/** The same spelled pitch in both voices. */
export const isUnison = ({ steps, semitones }: Sonority): boolean => steps === 0 && semitones === 0

/** A third or tenth, a sixth or thirteenth, by letters alone. */
export const isThird = ({ simpleSteps }: Sonority): boolean => simpleSteps === 2
export const isSixth = ({ simpleSteps }: Sonority): boolean => simpleSteps === 5

/** `perfect fifth`, `minor tenth`, `octave`. */
export const nameOf = (sonority: Sonority): string => nameInterval(sonority)

/** The size alone: `fifth`, `tenth`. */
export const sizeOf = ({ steps }: Sonority): string => nameSize(steps)

export const lineMove = (before: Sonority, now: Sonority): Direction => directionFrom(before.note, now.note)

export const cantusMove = (before: Sonority, now: Sonority): Direction =>
  directionFrom(before.other, now.other)

/** How far a voice moves, in letters: 0 stays, 1 steps, from 2 it leaps. */
export const lineSpan = (before: Sonority, now: Sonority): number =>
  Math.abs(stepsFrom(before.note, now.note))

export const cantusSpan = (before: Sonority, now: Sonority): number =>
  Math.abs(stepsFrom(before.other, now.other))

/** The direction both voices take together, or 0 when they do not. */
export function sharedDirection(before: Sonority, now: Sonority): Direction {
  const direction = lineMove(before, now)
  return direction === cantusMove(before, now) ? direction : 0
}

/** True when both voices move, one up and one down. */
export const isContrary = (before: Sonority, now: Sonority): boolean =>
  lineMove(before, now) * cantusMove(before, now) === -1

/** The voice that is meant to be the upper one, whether or not it has crossed. */
export const upperOf = ({ note, other }: Sonority, position: Position): Pitch =>
  position === 'above' ? note : other

export const lowerOf = ({ note, other }: Sonority, position: Position): Pitch =>
  position === 'above' ? other : note

export const degreeIn = (pitch: Pitch, { final }: Exercise): Degree => degreeOf(pitch, final)

/** Semitones by which a pitch departs from the mode's own note on its letter. */
export const alterationIn = (pitch: Pitch, { mode, final }: Exercise): number =>
  alterationInMode(pitch, mode, final)

/** A breach that points at sonorities, in order: at both voices, or at the line alone. */
export function breachAt(
  code: string,
  sonorities: readonly Sonority[],
  args: Breach['args'] = {},
  voices: 'both' | 'line' = 'both',
): Breach {
  return {
    code,
    bars: [...new Set(sonorities.map(({ bar }) => bar))],
    notes: sonorities.flatMap(({ bar, place }) => {
      const line = { voice: 'line' as const, bar, place }
      return voices === 'line' ? [line] : [line, { voice: 'cantus' as const, bar, place: 0 }]
    }),
    args,
  }
}
