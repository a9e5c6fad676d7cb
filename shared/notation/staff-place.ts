import type { Clef } from '@/shared/theory/clef'
import { diatonicNumber, letterIndex, LETTERS, type Letter, type Pitch } from '@/shared/theory/pitch'
import type { GlyphName } from '@/shared/notation/glyphs'

/** Lines of a staff, and the place of its top line when the bottom line is place 0 and each step is one. */
export const STAFF_LINES = 5
export const TOP_LINE_PLACE = 2 * (STAFF_LINES - 1)

/** A clef as it is drawn: its glyph, the place it sits on, and the pitch that place holds. */
type ClefPlace = Readonly<{ glyph: GlyphName; place: number; letter: Letter; octave: number }>

export const CLEF_PLACES: Readonly<Record<Clef, ClefPlace>> = {
  treble: { glyph: 'gClef', place: 2, letter: 'G', octave: 4 },
  'treble-8vb': { glyph: 'gClef8vb', place: 2, letter: 'G', octave: 3 },
  alto: { glyph: 'cClef', place: 4, letter: 'C', octave: 4 },
  tenor: { glyph: 'cClef', place: 6, letter: 'C', octave: 4 },
  bass: { glyph: 'fClef', place: 6, letter: 'F', octave: 3 },
}

const bottomLineNumber = (clef: Clef): number => {
  const { place, letter, octave } = CLEF_PLACES[clef]
  return 7 * octave + letterIndex(letter) - place
}

/** Steps above the bottom line: E4 in the treble clef is 0, F5 is 8, C4 is -2. Accidentals do not move a note. */
export const staffPlaceOf = (pitch: Pitch, clef: Clef): number =>
  diatonicNumber(pitch) - bottomLineNumber(clef)

/** The letter and octave standing at a place; the inverse of `staffPlaceOf`. */
export function pitchAtPlace(place: number, clef: Clef): { letter: Letter; octave: number } {
  const number = bottomLineNumber(clef) + place
  return { letter: LETTERS[((number % 7) + 7) % 7] as Letter, octave: Math.floor(number / 7) }
}

/** Places of the ledger lines a note needs, from the staff outwards; none inside the staff or in the spaces beside it. */
export function ledgerPlaces(place: number): readonly number[] {
  const places: number[] = []
  for (let line = -2; line >= place; line -= 2) places.push(line)
  for (let line = TOP_LINE_PLACE + 2; line <= place; line += 2) places.push(line)
  return places
}

/** Depth of a place below the top line in staff spaces: negative above the staff. */
export const depthStaffSpaces = (place: number): number => (TOP_LINE_PLACE - place) / 2
