import type { Mode } from '@/shared/theory/mode'

/** Fux's six canti firmi, from Gradus ad Parnassum, 1725; those on D, E and F as in the fixture, the others from memory. */
export const FUX_CANTUS: readonly Readonly<{ mode: Mode; final: string; notes: string }>[] = [
  { mode: 'dorian', final: 'D', notes: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4' },
  { mode: 'phrygian', final: 'E', notes: 'E4 C4 D4 C4 A3 A4 G4 E4 F4 E4' },
  { mode: 'lydian', final: 'F', notes: 'F3 G3 A3 F3 D3 E3 F3 C4 A3 F3 G3 F3' },
  { mode: 'mixolydian', final: 'G', notes: 'G3 C4 B3 G3 C4 E4 D4 G4 E4 C4 D4 B3 A3 G3' },
  { mode: 'aeolian', final: 'A', notes: 'A3 C4 B3 D4 C4 E4 F4 E4 D4 C4 B3 A3' },
  { mode: 'ionian', final: 'C', notes: 'C4 E4 F4 G4 E4 A4 G4 E4 F4 E4 D4 C4' },
]
