import type { Mode } from '@/shared/theory/mode'
import { letterIndex, type Alteration, type Letter, type PitchClass } from '@/shared/theory/pitch'

/** Accidentals at the clef: sharps positive, flats negative, seven at most. */
export type KeySignature = number

/** Letters in the order in which sharps appear; flats appear in the opposite order. */
export const SHARP_ORDER: readonly Letter[] = ['F', 'C', 'G', 'D', 'A', 'E', 'B']
export const FLAT_ORDER: readonly Letter[] = [...SHARP_ORDER].reverse()

/** Place of a natural on the chain of fifths, C at 0; in the order of `LETTERS`. */
const FIFTHS_OF_LETTER = [0, 2, 4, -1, 1, 3, 5] as const

/** How many fifths a mode's signature lies from that of the major key on the same final. */
const FIFTHS_OF_MODE: Readonly<Record<Mode, number>> = {
  lydian: 1,
  ionian: 0,
  mixolydian: -1,
  dorian: -2,
  aeolian: -3,
  phrygian: -4,
}

/** The signature that spells a mode on a final: 0 for Dorian on D, 1 for Dorian on A; `null` beyond seven accidentals. */
export function signatureOf(mode: Mode, final: PitchClass): KeySignature | null {
  const fifths =
    (FIFTHS_OF_LETTER[letterIndex(final.letter)] as number) + 7 * final.alteration + FIFTHS_OF_MODE[mode]
  return Math.abs(fifths) > 7 ? null : fifths
}

/** The accidental a signature gives to a letter. */
export function signatureAlteration(signature: KeySignature, letter: Letter): Alteration {
  if (signature > 0) return SHARP_ORDER.indexOf(letter) < signature ? 1 : 0
  return FLAT_ORDER.indexOf(letter) < -signature ? -1 : 0
}
