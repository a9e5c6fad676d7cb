import type { LibraryCantus } from './library-cantus'

const BOOK = 'J. J. Fux, Gradus ad Parnassum (Vienna 1725), Book II'

/**
 * The six canti firmi of Fux, one on each final. D, E and F are transcribed from the two-voice exercises (figures 5, 11 and
 * 13 of the Norton edition, after a transcription released under CC0; the F stands in the lower of the two octaves
 * in which it is printed). G, A and C are written down from memory of the same chapters.
 */
export const FUX_CANTUS: readonly LibraryCantus[] = [
  {
    id: 'library-fux-d',
    title: 'Fux on D',
    notes: 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4',
    mode: 'dorian',
    clef: 'treble',
    source: `${BOOK}, fig. 5`,
    origin: 'published',
  },
  {
    id: 'library-fux-e',
    title: 'Fux on E',
    notes: 'E4 C4 D4 C4 A3 A4 G4 E4 F4 E4',
    mode: 'phrygian',
    clef: 'treble',
    source: `${BOOK}, fig. 11`,
    origin: 'published',
  },
  {
    id: 'library-fux-f',
    title: 'Fux on F',
    notes: 'F3 G3 A3 F3 D3 E3 F3 C4 A3 F3 G3 F3',
    mode: 'lydian',
    clef: 'bass',
    source: `${BOOK}, fig. 13`,
    origin: 'published',
  },
  {
    id: 'library-fux-g',
    title: 'Fux on G',
    notes: 'G3 C4 B3 G3 C4 E4 D4 G4 E4 C4 D4 B3 A3 G3',
    mode: 'mixolydian',
    clef: 'alto',
    source: `${BOOK} (from memory)`,
    origin: 'published',
  },
  {
    id: 'library-fux-a',
    title: 'Fux on A',
    notes: 'A3 C4 B3 D4 C4 E4 F4 E4 D4 C4 B3 A3',
    mode: 'aeolian',
    clef: 'alto',
    source: `${BOOK} (from memory)`,
    origin: 'published',
  },
  {
    id: 'library-fux-c',
    title: 'Fux on C',
    notes: 'C4 E4 F4 G4 E4 A4 G4 E4 F4 E4 D4 C4',
    mode: 'ionian',
    clef: 'treble',
    source: `${BOOK} (from memory)`,
    origin: 'published',
  },
]
