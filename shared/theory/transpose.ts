import { fail, ok, type Result } from '@/shared/result'
import type { Direction, Interval } from '@/shared/theory/interval'
import {
  chromaticNumber,
  diatonicNumber,
  HIGHEST_OCTAVE,
  LETTERS,
  LOWEST_OCTAVE,
  type Alteration,
  type Letter,
  type Pitch,
} from '@/shared/theory/pitch'

/** Moves a pitch by an interval, keeping the spelling: a minor third above C♯4 is E4, never F♭4. */
export function transpose(
  pitch: Pitch,
  interval: Interval,
  direction: Exclude<Direction, 0> = 1,
): Result<Pitch, 'out-of-range' | 'no-spelling'> {
  const steps = diatonicNumber(pitch) + direction * interval.steps
  const octave = Math.floor(steps / 7)
  if (octave < LOWEST_OCTAVE || octave > HIGHEST_OCTAVE) return fail('out-of-range')
  const natural: Pitch = { letter: LETTERS[steps % 7] as Letter, alteration: 0, octave }
  const alteration = chromaticNumber(pitch) + direction * interval.semitones - chromaticNumber(natural)
  if (Math.abs(alteration) > 2) return fail('no-spelling')
  return ok({ ...natural, alteration: alteration as Alteration })
}
