import { letterIndex, type Pitch } from '@/shared/theory/pitch'

/** True when pitches use all three letters of one triad and no other: C, E and G in whatever order and octave. */
export function isLetterTriad(pitches: readonly Pitch[]): boolean {
  let letters = 0
  for (const { letter } of pitches) letters |= 1 << letterIndex(letter)
  for (let root = 0; root < 7; root += 1) {
    if (letters === ((1 << root) | (1 << ((root + 2) % 7)) | (1 << ((root + 4) % 7)))) return true
  }
  return false
}
