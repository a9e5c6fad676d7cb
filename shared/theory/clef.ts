import { diatonicNumber, LETTERS, type Letter, type Pitch } from '@/shared/theory/pitch'

/** Clefs the engraver knows. `treble-8vb` is the treble clef with a small 8 below, for tenors. */
export const CLEFS = ['treble', 'treble-8vb', 'alto', 'tenor', 'bass'] as const
export type Clef = (typeof CLEFS)[number]

/** Diatonic number of the note on the lowest line: E4, E3, F3, D3, G2. */
const BOTTOM_LINE: Readonly<Record<Clef, number>> = {
  treble: 30,
  'treble-8vb': 23,
  alto: 24,
  tenor: 22,
  bass: 18,
}

/** Ledger lines a class reads without counting, below and above the staff. Common practice, no source. */
const COMFORTABLE_LEDGER_LINES = 2

/** Staff position: 0 on the lowest line, 1 in the space above it, 8 on the highest line. */
export const staffPosition = (pitch: Pitch, clef: Clef): number => diatonicNumber(pitch) - BOTTOM_LINE[clef]

/** The natural note at a staff position of a clef: position 0 of the bass clef is G2. */
export function pitchAtPosition(position: number, clef: Clef): Pitch {
  const steps = position + BOTTOM_LINE[clef]
  return { letter: LETTERS[((steps % 7) + 7) % 7] as Letter, alteration: 0, octave: Math.floor(steps / 7) }
}

/** Lowest and highest natural that a clef carries with at most two ledger lines on either side. */
export const comfortableRange = (clef: Clef): Readonly<{ lowest: Pitch; highest: Pitch }> => ({
  lowest: pitchAtPosition(-2 * COMFORTABLE_LEDGER_LINES, clef),
  highest: pitchAtPosition(8 + 2 * COMFORTABLE_LEDGER_LINES, clef),
})

/** True when a clef carries the pitch with at most two ledger lines. */
export function isComfortable(pitch: Pitch, clef: Clef): boolean {
  const position = staffPosition(pitch, clef)
  return position >= -2 * COMFORTABLE_LEDGER_LINES && position <= 8 + 2 * COMFORTABLE_LEDGER_LINES
}
