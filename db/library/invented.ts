import type { LibraryCantus } from './library-cantus'

const invented = (
  id: string,
  title: string,
  notes: string,
  mode: LibraryCantus['mode'],
  clef: LibraryCantus['clef'],
) =>
  ({
    id: `library-invented-${id}`,
    title,
    notes,
    mode,
    clef,
    source: 'Invented for this library',
    origin: 'invented',
  }) satisfies LibraryCantus

/** Canti firmi made for this library. Each breaks no law that any of the shipped rule sets has for a cantus. */
export const INVENTED_CANTUS: readonly LibraryCantus[] = [
  invented('stair', 'The stair', 'D4 E4 G4 F4 A4 G4 C5 B4 A4 F4 E4 D4', 'dorian', 'treble'),
  invented('gate', 'The garden gate', 'C4 D4 F4 E4 G4 A4 F4 E4 D4 C4', 'ionian', 'treble'),
  invented('well', 'The well', 'A3 B3 D4 C4 A3 E4 D4 C4 B3 A3', 'aeolian', 'alto'),
  invented('orchard', 'The orchard wall', 'G3 A3 C4 B3 D4 E4 C4 D4 B3 A3 G3', 'mixolydian', 'tenor'),
  invented('ferry', 'The ferry', 'E3 G3 F3 A3 G3 C4 B3 A3 F3 E3', 'phrygian', 'bass'),
  invented('lantern', 'The lantern', 'F3 A3 G3 Bb3 A3 C4 D4 C4 A3 G3 F3', 'ionian', 'bass'),
  invented('heron', 'The heron', 'G4 A4 Bb4 G4 C5 Bb4 D5 C5 A4 Bb4 A4 G4', 'dorian', 'treble'),
  invented('mill', 'The mill race', 'A3 C#4 B3 D4 C#4 E4 F#4 E4 C#4 B3 A3', 'ionian', 'treble-8vb'),
]
