import {
  alterationIn,
  breachAt,
  degreeIn,
  nameOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import type { Breach, Exercise } from '@/shared/rules/rule'

/**
 * Judges the last sonority but one by what the cantus does there. Over 2–1 the line stands on the seventh degree, at a
 * major sixth above or a minor third below; over 7–1 it stands on the second degree. Where the reduction leaves the
 * cantus on another degree there is no formula to ask for.
 */
export function judgePenultimate(now: Sonority, exercise: Exercise): Breach | null {
  const cantusDegree = degreeIn(now.other, exercise)
  const lineDegree = degreeIn(now.note, exercise)
  if (cantusDegree === 7) {
    const isSecond = lineDegree === 2 && alterationIn(now.note, exercise) === 0
    return isSecond ? null : breachAt('not-second', [now])
  }
  if (cantusDegree !== 2) return null
  const args = { interval: nameOf(now) }
  const isAbove = exercise.position === 'above'
  if (now.simpleSteps !== (isAbove ? 5 : 2)) return breachAt('not-leading', [now], args)
  return now.simpleSemitones === (isAbove ? 9 : 3) ? null : breachAt('wrong-size', [now], args)
}
