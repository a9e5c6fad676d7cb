import type { Mode } from '@/shared/theory/mode'
import type { Alteration, PitchClass } from '@/shared/theory/pitch'
import { scaleOf, type Degree } from '@/shared/theory/scale'

/** The degree that makes a tritone over another of its mode: B over F, untransposed. Common practice, no source. */
const TRITONE_TOP: Readonly<Record<Mode, Degree>> = {
  ionian: 7,
  dorian: 6,
  phrygian: 5,
  lydian: 4,
  mixolydian: 3,
  aeolian: 2,
}

/** The degree that is lowered to avoid a tritone: B flat in an untransposed mode, E flat in Dorian on G. */
export const usualFlatDegree = (mode: Mode): Degree => TRITONE_TOP[mode]

/** The note that avoids the mode's tritone, or `null` where no spelling carries it. */
export function usualFlatOf(mode: Mode, final: PitchClass): PitchClass | null {
  const scale = scaleOf(mode, final)
  const top = scale.ok ? scale.value[usualFlatDegree(mode) - 1] : undefined
  if (!top || top.alteration === -2) return null
  return { letter: top.letter, alteration: (top.alteration - 1) as Alteration }
}
