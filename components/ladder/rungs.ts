import type { Exercise } from '@/shared/rules'
import { intervalBetween } from '@/shared/theory/interval'
import { leadingToneOf, raisesSeventh, scaleBetween } from '@/shared/theory/scale'
import {
  chromaticNumber,
  comparePitches,
  diatonicNumber,
  LETTERS,
  type Alteration,
  type Pitch,
} from '@/shared/theory/pitch'

/** Farthest that the ladder goes beyond the cantus: a twelfth, the outer limit of two voices. Common practice, no source. */
const REACH_STEPS = 11
/** How far a voice may cross, for those who want to try it: a third. */
const CROSSING_STEPS = 2

const pitchAtStep = (steps: number, alteration: Alteration = 0): Pitch => ({
  letter: LETTERS[((steps % 7) + 7) % 7] ?? 'C',
  alteration,
  octave: Math.floor(steps / 7),
})

const extremes = (cantus: readonly Pitch[]): Readonly<{ low: number; high: number }> => {
  const steps = cantus.map(diatonicNumber)
  return { low: Math.min(...steps), high: Math.max(...steps) }
}

/** Every accidental of a pitch that has one, for the longer ladder. */
const alterations = (pitch: Pitch): readonly Pitch[] =>
  ([-1, 0, 1] as const).map((alteration) => ({ ...pitch, alteration }))

/**
 * The pitches at hand for a whole exercise, from the highest down: the notes of the mode within reach of the cantus, and the
 * raised seventh where the mode raises it. They are the same in every bar, so that a rung stays where the hand expects it.
 * `isChromatic` adds every note with a single accidental.
 */
export function ladderPitches(exercise: Exercise, isChromatic: boolean): readonly Pitch[] {
  const { low, high } = extremes(exercise.cantus)
  const [from, to] =
    exercise.position === 'above'
      ? [low - CROSSING_STEPS, low + Math.max(REACH_STEPS, high - low + 7)]
      : [high - Math.max(REACH_STEPS, high - low + 7), high + CROSSING_STEPS]
  const lowest = Math.max(from, 7)
  const highest = Math.min(to, 7 * 8)
  const pitches = [...scaleBetween(exercise.mode, exercise.final, pitchAtStep(lowest), pitchAtStep(highest))]
  const leading = raisesSeventh(exercise.mode) ? leadingToneOf(exercise.mode, exercise.final) : null
  const more: Pitch[] = []
  for (const pitch of pitches) {
    if (isChromatic) more.push(...alterations(pitch))
    else if (leading && pitch.letter === leading.letter) more.push({ ...leading, octave: pitch.octave })
  }
  for (const pitch of more)
    if (!pitches.some((known) => comparePitches(known, pitch) === 0)) pitches.push(pitch)
  return pitches.sort((a, b) => comparePitches(b, a))
}

/** The rung to show first for a bar: where the line is, or would sit well, a third to a sixth from the cantus. */
export function homeRung(
  rungs: readonly Pitch[],
  near: Pitch | null,
  cantus: Pitch,
  position: Exercise['position'],
): number {
  const target = near ? chromaticNumber(near) : chromaticNumber(cantus) + (position === 'above' ? 7 : -7)
  let best = 0
  rungs.forEach((pitch, index) => {
    const isNearer =
      Math.abs(chromaticNumber(pitch) - target) < Math.abs(chromaticNumber(rungs[best] as Pitch) - target)
    if (isNearer) best = index
  })
  return best
}

/** The rung that a typed letter means: the one of that letter nearest to where the hand is, above before below. */
export function rungOfLetter(rungs: readonly Pitch[], letter: string, from: number): number | null {
  let best: number | null = null
  rungs.forEach((pitch, index) => {
    if (pitch.letter !== letter.toUpperCase() || index === from) return
    const distance = Math.abs(index - from)
    if (best === null || distance < Math.abs(best - from)) best = index
  })
  return best
}

/** True when a pitch lies on the wrong side of the cantus note it sounds with. */
export const isCrossing = (pitch: Pitch, cantus: Pitch, position: Exercise['position']): boolean =>
  position === 'above' ? comparePitches(pitch, cantus) < 0 : comparePitches(pitch, cantus) > 0

/** True for the same staff place and accidental. */
export const isUnison = (a: Pitch, b: Pitch): boolean => {
  const { steps, semitones } = intervalBetween(a, b)
  return steps === 0 && semitones === 0
}
