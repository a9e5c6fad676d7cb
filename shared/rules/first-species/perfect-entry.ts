import { z } from 'zod'
import {
  breachAt,
  cantusSpan,
  degreeIn,
  isThird,
  isUnison,
  lineSpan,
  lowerOf,
  perfectKindOf,
  sharedDirection,
  sizeOf,
  upperOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import type { Breach, Exercise } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

/**
 * What schools let pass. `upper-step`: the upper voice steps. `either-step`: one of the voices steps. `rising-semitone`:
 * an octave, the upper voice rising a semitone. `tonic-dominant`: the lower voice goes between the first and fifth
 * degrees. `leading-third`: from a third over the leading tone to a fifth over the final.
 */
const EXCEPTIONS = [
  'upper-step',
  'either-step',
  'rising-semitone',
  'tonic-dominant',
  'leading-third',
] as const
type Exception = (typeof EXCEPTIONS)[number]

/** For rules that forbid similar motion into a perfect consonance. */
export const similarMotionParam = z
  .array(z.enum(EXCEPTIONS))
  .default([])
  .describe('Similar motion that is let pass.')

/** Two perfect consonances of one kind, both voices moving the same way. */
export function judgeParallel(before: Sonority, now: Sonority): Breach | null {
  const kind = perfectKindOf(now)
  if (kind === null || kind !== perfectKindOf(before) || sharedDirection(before, now) === 0) return null
  if (kind === 'fifth') return breachAt('fifths', [before, now])
  return breachAt(isUnison(before) && isUnison(now) ? 'unisons' : 'octaves', [before, now])
}

/** A perfect consonance entered by similar motion from anything but its own kind. */
export function judgeSimilarMotion(
  before: Sonority,
  now: Sonority,
  exercise: Exercise,
  exceptions: readonly Exception[],
): Breach | null {
  const kind = perfectKindOf(now)
  if (kind === null || kind === perfectKindOf(before)) return null
  const direction = sharedDirection(before, now)
  if (direction === 0) return null
  if (exceptions.some((exception) => isExcepted(exception, before, now, exercise))) return null
  return breachAt(direction > 0 ? 'rise-into' : 'fall-into', [before, now], { interval: sizeOf(now) })
}

/** Both of these together: what first species asks wherever both voices move. */
export const judgePerfectEntry = (
  before: Sonority,
  now: Sonority,
  exercise: Exercise,
  exceptions: readonly Exception[],
): Breach | null => judgeParallel(before, now) ?? judgeSimilarMotion(before, now, exercise, exceptions)

function isExcepted(exception: Exception, before: Sonority, now: Sonority, exercise: Exercise): boolean {
  const { position } = exercise
  const upperBefore = upperOf(before, position)
  const upper = upperOf(now, position)
  switch (exception) {
    case 'upper-step':
      return Math.abs(stepsFrom(upperBefore, upper)) === 1
    case 'either-step':
      return lineSpan(before, now) === 1 || cantusSpan(before, now) === 1
    case 'rising-semitone':
      return (
        perfectKindOf(now) === 'octave' &&
        stepsFrom(upperBefore, upper) === 1 &&
        semitonesFrom(upperBefore, upper) === 1
      )
    case 'tonic-dominant': {
      const degrees = [before, now].map((sonority) => degreeIn(lowerOf(sonority, position), exercise))
      return degrees.includes(1) && degrees.includes(5)
    }
    case 'leading-third':
      return (
        perfectKindOf(now) === 'fifth' &&
        isThird(before) &&
        degreeIn(lowerOf(before, position), exercise) === 7 &&
        degreeIn(lowerOf(now, position), exercise) === 1
      )
  }
}
