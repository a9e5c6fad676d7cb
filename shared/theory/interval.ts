import { chromaticNumber, comparePitches, diatonicNumber, type Pitch } from '@/shared/theory/pitch'

/**
 * The distance of two spelled pitches, without direction: letters counted in steps (unison 0, third 2, octave 7) and
 * semitones. Both count from the lower to the higher *letter*, so an exotic spelling such as B♯♯3–C4 has −1 semitones.
 */
export type Interval = Readonly<{ steps: number; semitones: number }>

/** Up, down, or staying. */
export type Direction = 1 | 0 | -1

/** `P` perfect, `M` major, `m` minor, `A` augmented, `d` diminished; doubled letters for doubly augmented and so on. */
export type Quality = 'P' | 'M' | 'm' | `A${string}` | `d${string}`

/** Semitones of the perfect and major intervals, unison to seventh. */
const NATURAL_SEMITONES = [0, 2, 4, 5, 7, 9, 11] as const

/** Steps of the intervals that are perfect rather than major or minor: unison, fourth, fifth. */
const isPerfectKind = (simpleSteps: number): boolean =>
  simpleSteps === 0 || simpleSteps === 3 || simpleSteps === 4

/** Signed steps from one pitch to another: a third down is −2. Allocates nothing; made for rules. */
export const stepsFrom = (a: Pitch, b: Pitch): number => diatonicNumber(b) - diatonicNumber(a)

/** Signed semitones from one pitch to another. */
export const semitonesFrom = (a: Pitch, b: Pitch): number => chromaticNumber(b) - chromaticNumber(a)

/** Which way one goes from the first pitch to the second, by letter first and accidental second. */
export const directionFrom = (a: Pitch, b: Pitch): Direction => Math.sign(comparePitches(b, a)) as Direction

/** The undirected interval of two pitches: `intervalBetween(D4, A4)` is five letters and seven semitones, `P5`. */
export function intervalBetween(a: Pitch, b: Pitch): Interval {
  const [low, high] = comparePitches(a, b) <= 0 ? [a, b] : [b, a]
  return { steps: stepsFrom(low, high), semitones: semitonesFrom(low, high) }
}

/** Whole octaves in an interval: 0 for a seventh, 1 for an octave or a tenth. */
export const octavesIn = ({ steps }: Interval): number => Math.floor(steps / 7)

/** Takes the octaves out: a tenth becomes a third, an octave a unison. */
export const simpleInterval = ({ steps, semitones }: Interval): Interval => ({
  steps: steps % 7,
  semitones: semitones - 12 * Math.floor(steps / 7),
})

export const isSameInterval = (a: Interval, b: Interval): boolean =>
  a.steps === b.steps && a.semitones === b.semitones

/** True for the second, whatever its quality. */
export const isStep = ({ steps }: Interval): boolean => steps === 1

/** True from the third up. */
export const isLeap = ({ steps }: Interval): boolean => steps >= 2

/** True for a unison, fifth or octave, perfect, in any octave. */
export function isPerfectConsonance(interval: Interval): boolean {
  const { steps, semitones } = simpleInterval(interval)
  return (steps === 0 && semitones === 0) || (steps === 4 && semitones === 7)
}

/** True for a major or minor third or sixth in any octave. */
export function isImperfectConsonance(interval: Interval): boolean {
  const { steps, semitones } = simpleInterval(interval)
  if (steps === 2) return semitones === 3 || semitones === 4
  return steps === 5 && (semitones === 8 || semitones === 9)
}

/** Consonant between two voices, where the fourth counts as a dissonance. */
export const isConsonant = (interval: Interval): boolean =>
  isPerfectConsonance(interval) || isImperfectConsonance(interval)

/** The quality of an interval by its spelling: F–B is `A`, a fourth, and F–C♭ is `d`, a fifth. */
export function qualityOf(interval: Interval): Quality {
  const { steps, semitones } = simpleInterval(interval)
  const excess = semitones - (NATURAL_SEMITONES[steps] as number)
  if (excess > 0) return `A${'A'.repeat(excess - 1)}`
  if (isPerfectKind(steps)) return excess === 0 ? 'P' : `d${'d'.repeat(-excess - 1)}`
  if (excess === 0) return 'M'
  return excess === -1 ? 'm' : `d${'d'.repeat(-excess - 2)}`
}

/** The figure for the rail between the staves: `5`, `10`. */
export const figureOf = ({ steps }: Interval): string => String(steps + 1)
