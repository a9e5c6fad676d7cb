import { directionFrom, stepsFrom } from '@/shared/theory/interval'
import type { Pitch } from '@/shared/theory/pitch'

/** How two voices move together from one sonority to the next. */
export type Motion = 'contrary' | 'oblique' | 'similar' | 'parallel'

/**
 * The motion of two voices. Parallel is similar motion that keeps the generic interval (a third stays a third).
 * `null` when neither voice moves.
 */
export function motionBetween(
  previousCantus: Pitch,
  cantus: Pitch,
  previousLine: Pitch,
  line: Pitch,
): Motion | null {
  const cantusDirection = directionFrom(previousCantus, cantus)
  const lineDirection = directionFrom(previousLine, line)
  if (cantusDirection === 0 && lineDirection === 0) return null
  if (cantusDirection === 0 || lineDirection === 0) return 'oblique'
  if (cantusDirection !== lineDirection) return 'contrary'
  return stepsFrom(previousCantus, previousLine) === stepsFrom(cantus, line) ? 'parallel' : 'similar'
}
