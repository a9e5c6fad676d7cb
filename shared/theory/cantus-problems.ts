import { isComfortable, type Clef } from '@/shared/theory/clef'
import type { Mode } from '@/shared/theory/mode'
import type { Pitch, PitchClass } from '@/shared/theory/pitch'
import { isDiatonic, isFinal } from '@/shared/theory/scale'

/** What keeps a melody from being used as a cantus, or wants a second look. Words come from the locale table. */
export type CantusProblem = Readonly<{
  code: 'too-short' | 'too-long' | 'out-of-clef-range' | 'wrong-final' | 'not-diatonic'
  /** 1-based bars it points at; for a length the last bar, or none where nothing is written. */
  bars: readonly number[]
}>

/** Looks a cantus over before it is kept: its length within `least` and `most`, its clef, its final, its mode. */
export function findCantusProblems(
  cantus: readonly Pitch[],
  given: Readonly<{ mode: Mode; final: PitchClass; clef: Clef; least: number; most: number }>,
): readonly CantusProblem[] {
  const { mode, final, clef, least, most } = given
  const last = cantus.at(-1)
  const barsWhere = (isAtFault: (pitch: Pitch) => boolean): readonly number[] =>
    cantus.flatMap((pitch, index) => (isAtFault(pitch) ? [index + 1] : []))
  const outside = barsWhere((pitch) => !isComfortable(pitch, clef))
  const foreign = barsWhere((pitch) => !isDiatonic(pitch, mode, final))
  const problems: CantusProblem[] = []
  const end = cantus.length === 0 ? [] : [cantus.length]
  if (cantus.length < least) problems.push({ code: 'too-short', bars: end })
  if (cantus.length > most) problems.push({ code: 'too-long', bars: end })
  if (outside.length > 0) problems.push({ code: 'out-of-clef-range', bars: outside })
  if (last !== undefined && !isFinal(last, final)) problems.push({ code: 'wrong-final', bars: end })
  if (foreign.length > 0) problems.push({ code: 'not-diatonic', bars: foreign })
  return problems
}
