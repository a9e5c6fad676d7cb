import { signatureAlteration, signatureMarks } from '@/shared/notation/key-signature'
import { ledgerPlaces, pitchAtPlace, staffPlaceOf } from '@/shared/notation/staff-place'
import { CLEFS, type Clef } from '@/shared/theory/clef'
import { diatonicNumber, LETTERS, pitchOf, type Letter } from '@/shared/theory/pitch'

/** The pitches on the five lines, from the lowest: what every musician knows of a clef. */
const LINES: Readonly<Record<Clef, readonly string[]>> = {
  treble: ['E4', 'G4', 'B4', 'D5', 'F5'],
  'treble-8vb': ['E3', 'G3', 'B3', 'D4', 'F4'],
  alto: ['F3', 'A3', 'C4', 'E4', 'G4'],
  tenor: ['D3', 'F3', 'A3', 'C4', 'E4'],
  bass: ['G2', 'B2', 'D3', 'F3', 'A3'],
}

describe('places on a staff', () => {
  test.each(CLEFS)('the lines of the %s clef hold their pitches', (clef) => {
    expect(LINES[clef].map((name) => staffPlaceOf(pitchOf(name), clef))).toEqual([0, 2, 4, 6, 8])
  })

  test('an accidental does not move a note', () => {
    expect(staffPlaceOf(pitchOf('F#5'), 'treble')).toBe(staffPlaceOf(pitchOf('Fb5'), 'treble'))
  })

  test.each(CLEFS)('a place of the %s clef gives back its pitch', (clef) => {
    for (let place = -8; place <= 16; place++) {
      const pitch = { ...pitchAtPlace(place, clef), alteration: 0 as const }
      expect(staffPlaceOf(pitch, clef)).toBe(place)
    }
  })

  test.each([
    [0, []],
    [-1, []],
    [-2, [-2]],
    [-3, [-2]],
    [-4, [-2, -4]],
    [8, []],
    [9, []],
    [10, [10]],
    [13, [10, 12]],
  ])('a note at place %i has its ledger lines', (place, lines) => {
    expect(ledgerPlaces(place)).toEqual(lines)
  })
})

const SHARPS: readonly Letter[] = ['F', 'C', 'G', 'D', 'A', 'E', 'B']

describe('key signatures', () => {
  test.each(CLEFS)('in the %s clef stand on their own letters, on or beside the staff', (clef) => {
    for (const signature of [7, -7]) {
      const marks = signatureMarks(signature, clef)
      const order = signature > 0 ? SHARPS : [...SHARPS].reverse()
      expect(marks.map(({ place }) => pitchAtPlace(place, clef).letter)).toEqual(order)
      for (const { place } of marks) {
        expect(place).toBeGreaterThanOrEqual(-1)
        expect(place).toBeLessThanOrEqual(9)
      }
    }
  })

  // Gould, Behind Bars (2011), the table of key signatures; from memory.
  test.each<[Clef, number, readonly string[]]>([
    ['treble', 7, ['F5', 'C5', 'G5', 'D5', 'A4', 'E5', 'B4']],
    ['treble', -7, ['B4', 'E5', 'A4', 'D5', 'G4', 'C5', 'F4']],
    ['treble-8vb', 2, ['F4', 'C4']],
    ['alto', 7, ['F4', 'C4', 'G4', 'D4', 'A3', 'E4', 'B3']],
    ['alto', -7, ['B3', 'E4', 'A3', 'D4', 'G3', 'C4', 'F3']],
    ['tenor', 7, ['F3', 'C4', 'G3', 'D4', 'A3', 'E4', 'B3']],
    ['tenor', -7, ['B3', 'E4', 'A3', 'D4', 'G3', 'C4', 'F3']],
    ['bass', 7, ['F3', 'C3', 'G3', 'D3', 'A2', 'E3', 'B2']],
    ['bass', -7, ['B2', 'E3', 'A2', 'D3', 'G2', 'C3', 'F2']],
  ])('in the %s clef with %i stand where engravers put them', (clef, signature, pitches) => {
    const numbers = signatureMarks(signature, clef).map(({ place }) => {
      const { letter, octave } = pitchAtPlace(place, clef)
      return diatonicNumber({ letter, octave, alteration: 0 })
    })
    expect(numbers).toEqual(pitches.map((name) => diatonicNumber(pitchOf(name))))
  })

  test('alter the letters they name and no other', () => {
    expect(LETTERS.filter((letter) => signatureAlteration(2, letter) === 1)).toEqual(['C', 'F'])
    expect(LETTERS.filter((letter) => signatureAlteration(-3, letter) === -1)).toEqual(['E', 'A', 'B'])
    expect(LETTERS.map((letter) => signatureAlteration(0, letter))).toEqual([0, 0, 0, 0, 0, 0, 0])
  })
})
