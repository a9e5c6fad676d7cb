import { isLetterTriad } from '@/shared/rules/melody/letter-triad'
import { chromaticNumber, type Pitch } from '@/shared/theory/pitch'

/** Semitones above the root of the major and the minor triad. */
const MAJOR = [0, 4, 7] as const
const MINOR = [0, 3, 7] as const

/** True when three pitches are, in whatever order and octave, the three notes of one major or minor triad. */
export function isTriad(pitches: readonly Pitch[]): boolean {
  if (!isLetterTriad(pitches)) return false
  const classes = pitches.map((pitch) => chromaticNumber(pitch) % 12)
  return classes.some((root) => {
    const above = classes.map((pitchClass) => (pitchClass - root + 12) % 12)
    return [MAJOR, MINOR].some((shape) => shape.every((semitones) => above.includes(semitones)))
  })
}
