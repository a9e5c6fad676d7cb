import { Note } from 'tonal'
import {
  CLEFS,
  comfortableRange,
  isComfortable,
  pitchAtPosition,
  staffPosition,
  type Clef,
} from '@/shared/theory/clef'
import { frequencyHertz, midiNumber } from '@/shared/theory/frequency'
import { motionBetween } from '@/shared/theory/motion'
import { formatPitch, pitchOf } from '@/shared/theory/pitch'
import { EVERY_PITCH } from './every-pitch'

test('A4 is 440 Hz (ISO 16) and the MIDI number 69', () => {
  expect(frequencyHertz(pitchOf('A4'))).toBe(440)
  expect(midiNumber(pitchOf('A4'))).toBe(69)
})

test('equal temperament: every half step is the twelfth root of two, every octave doubles', () => {
  for (const pitch of EVERY_PITCH) {
    const hertz = frequencyHertz(pitch)
    expect(hertz).toBeCloseTo(440 * 2 ** ((Note.midi(formatPitch(pitch))! - 69) / 12), 9)
    expect(frequencyHertz({ ...pitch, octave: pitch.octave + 1 }) / hertz).toBeCloseTo(2, 12)
    if (pitch.alteration < 2) {
      const sharper = { ...pitch, alteration: (pitch.alteration + 1) as typeof pitch.alteration }
      expect(frequencyHertz(sharper) / hertz).toBeCloseTo(2 ** (1 / 12), 12)
    }
  }
})

/** Equal-tempered frequencies at A4 = 440 Hz, to a hundredth; common practice, no source. */
test.each([
  ['C4', 261.63],
  ['C#4', 277.18],
  ['Db4', 277.18],
  ['E4', 329.63],
  ['A3', 220],
  ['C8', 4186.01],
  ['A0', 27.5],
])('%s sounds at %d Hz', (name, hertz) => {
  expect(frequencyHertz(pitchOf(name))).toBeCloseTo(hertz, 2)
})

/** Lowest line, middle line, highest line of each clef; common practice, no source. */
test.each<[Clef, string, string, string]>([
  ['treble', 'E4', 'B4', 'F5'],
  ['treble-8vb', 'E3', 'B3', 'F4'],
  ['alto', 'F3', 'C4', 'G4'],
  ['tenor', 'D3', 'A3', 'E4'],
  ['bass', 'G2', 'D3', 'A3'],
])('the lines of the %s staff stand for %s, %s, %s', (clef, low, middle, high) => {
  expect([low, middle, high].map((name) => staffPosition(pitchOf(name), clef))).toEqual([0, 4, 8])
  expect([0, 4, 8].map((position) => formatPitch(pitchAtPosition(position, clef)))).toEqual([
    low,
    middle,
    high,
  ])
})

test('each clef carries two ledger lines with comfort, and its own range', () => {
  expect(CLEFS.map((clef) => Object.values(comfortableRange(clef)).map(formatPitch))).toEqual([
    ['A3', 'C6'],
    ['A2', 'C5'],
    ['B2', 'D5'],
    ['G2', 'B4'],
    ['C2', 'E4'],
  ])
  for (const clef of CLEFS) {
    const { lowest, highest } = comfortableRange(clef)
    expect(isComfortable(lowest, clef) && isComfortable(highest, clef)).toBe(true)
    expect(isComfortable(pitchAtPosition(-5, clef), clef)).toBe(false)
    expect(isComfortable(pitchAtPosition(13, clef), clef)).toBe(false)
  }
})

/** Previous cantus, cantus, previous line, line. Common practice, no source. */
test.each([
  ['D4', 'F4', 'A4', 'G4', 'contrary'],
  ['D4', 'F4', 'A4', 'A4', 'oblique'],
  ['D4', 'D4', 'A4', 'B4', 'oblique'],
  ['D4', 'F4', 'A4', 'B4', 'similar'],
  ['D4', 'E4', 'A4', 'B4', 'parallel'],
  ['E4', 'D4', 'G4', 'F4', 'parallel'],
  ['D4', 'E4', 'A3', 'B3', 'parallel'],
  ['D4', 'D4', 'A4', 'A4', null],
])('%s–%s under %s–%s is %s motion', (previousCantus, cantus, previousLine, line, motion) => {
  expect(motionBetween(pitchOf(previousCantus), pitchOf(cantus), pitchOf(previousLine), pitchOf(line))).toBe(
    motion,
  )
})
