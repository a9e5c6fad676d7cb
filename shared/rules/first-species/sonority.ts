import type { Breach, Exercise, Moment, Position, Voice } from '@/shared/rules/rule'
import { directionFrom, isConsonant, stepsFrom, type Direction } from '@/shared/theory/interval'
import { nameInterval, nameSize } from '@/shared/theory/interval-name'
import type { Pitch } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf, type Degree } from '@/shared/theory/scale'

/** A moment at which both voices sound; the interval between them is that of the moment. */
export type Sonority = Moment & Readonly<{ note: Pitch; other: Pitch }>

/** Two kinds of perfect consonance: octaves count with unisons, twelfths with fifths. */
export type PerfectKind = 'octave' | 'fifth'

const isSonority = (moment: Moment): moment is Sonority =>
  moment.note !== null && moment.note !== 'rest' && moment.other !== null

/** Both voices of a moment, or `null` when the line rests there or is not written yet. */
export const sonorityOf = (moment: Moment): Sonority | null => (isSonority(moment) ? moment : null)

export function perfectKindOf({ simpleSteps, simpleSemitones }: Sonority): PerfectKind | null {
  if (simpleSteps === 0) return simpleSemitones === 0 ? 'octave' : null
  return simpleSteps === 4 && simpleSemitones === 7 ? 'fifth' : null
}

/** Neither a perfect consonance nor a third or a sixth; between two voices the fourth is a dissonance. */
export const isDissonance = ({ simpleSteps, simpleSemitones }: Sonority): boolean =>
  !isConsonant({ steps: simpleSteps, semitones: simpleSemitones })

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
  const bars: number[] = []
  const notes: { voice: Voice; bar: number; place: number }[] = []
  for (const { bar, place } of sonorities) {
    if (bars[bars.length - 1] !== bar) bars.push(bar)
    notes.push({ voice: 'line', bar, place })
    if (voices === 'both') notes.push({ voice: 'cantus', bar, place: 0 })
  }
  return { code, bars, notes, args }
}
