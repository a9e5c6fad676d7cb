import { z } from 'zod'
import { breachAt, perfectKindOf, sizeOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { asRemark } from '@/shared/rules/fold'
import type { Breach } from '@/shared/rules/rule'

/** Intervals with which a line may begin or end. A fifth stands for the twelfth too, an octave for the fifteenth. */
export const OPENINGS = ['unison', 'fifth', 'octave'] as const
export type Opening = (typeof OPENINGS)[number]

export const openingList = (fallback: readonly Opening[], description: string) =>
  z
    .array(z.enum(OPENINGS))
    .default([...fallback])
    .describe(description)

/** Which of the perfect intervals stands between the voices, if any. */
export function openingOf(sonority: Sonority): Opening | null {
  const kind = perfectKindOf(sonority)
  if (kind !== 'octave') return kind
  return sonority.steps === 0 ? 'unison' : 'octave'
}

/** Judges the first sonority by the intervals a rule set allows, and by those it only tolerates. */
export function judgeOpening(
  now: Sonority,
  allowed: readonly Opening[],
  secondBest: readonly Opening[],
): Breach | null {
  const opening = openingOf(now)
  if (opening !== null && allowed.includes(opening)) return null
  const args = { interval: sizeOf(now), allowed: allowed.join(', ') }
  if (opening !== null && secondBest.includes(opening)) {
    return asRemark(breachAt('second-best', [now], args))
  }
  return breachAt(opening === null ? 'not-perfect' : 'not-allowed', [now], args)
}
