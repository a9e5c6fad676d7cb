import type { Position } from '@/shared/rules'
import { CLEFS, staffPosition, type Clef } from '@/shared/theory/clef'
import { diatonicNumber, LETTERS, type Pitch } from '@/shared/theory/pitch'

/** Where the added line mostly lies: from a third beyond the nearest cantus note to a tenth beyond the middle of it. */
const NEAREST_STEPS = 2
const FARTHEST_STEPS = 9

/** Clefs that a class reads most readily are suggested when others carry the notes no better. */
const PREFERENCE: readonly Clef[] = ['treble', 'bass', 'treble-8vb', 'alto', 'tenor']

const middleOf = (steps: readonly number[]): number => (Math.min(...steps) + Math.max(...steps)) / 2

const pitchAt = (steps: number): Pitch => ({
  letter: LETTERS[((steps % 7) + 7) % 7] ?? 'C',
  alteration: 0,
  octave: Math.floor(steps / 7),
})

/** How far outside the staff the notes of a range go, in staff positions, both sides together. */
function overhang(low: Pitch, high: Pitch, clef: Clef): number {
  return Math.max(0, -1 - staffPosition(low, clef)) + Math.max(0, staffPosition(high, clef) - 9)
}

function bestClef(low: Pitch, high: Pitch): Clef {
  return [...PREFERENCE].sort(
    (a, b) =>
      overhang(low, high, a) - overhang(low, high, b) || PREFERENCE.indexOf(a) - PREFERENCE.indexOf(b),
  )[0] as Clef
}

/** The range in which a line over or under a cantus will mostly move. */
export function expectedRange(
  cantus: readonly Pitch[],
  position: Position,
): Readonly<{ low: Pitch; high: Pitch }> {
  const steps = cantus.map(diatonicNumber)
  const middle = Math.round(middleOf(steps))
  return position === 'above'
    ? { low: pitchAt(Math.min(...steps) + NEAREST_STEPS), high: pitchAt(middle + FARTHEST_STEPS) }
    : { low: pitchAt(middle - FARTHEST_STEPS), high: pitchAt(Math.max(...steps) - NEAREST_STEPS) }
}

/** Clefs that carry both voices with the fewest ledger lines. The cantus keeps the clef it was written in where that serves as well. */
export function suggestClefs(
  cantus: readonly Pitch[],
  position: Position,
  written: Clef,
): Readonly<{ cantus: Clef; line: Clef }> {
  const steps = cantus.map(diatonicNumber)
  const low = pitchAt(Math.min(...steps))
  const high = pitchAt(Math.max(...steps))
  const best = bestClef(low, high)
  const range = expectedRange(cantus, position)
  return {
    cantus: overhang(low, high, written) <= overhang(low, high, best) ? written : best,
    line: bestClef(range.low, range.high),
  }
}

/** Every clef, the readiest first: what a teacher may change to. */
export const CLEF_CHOICES: readonly Clef[] = [...CLEFS].sort(
  (a, b) => PREFERENCE.indexOf(a) - PREFERENCE.indexOf(b),
)
