import { frequencyHertz, midiNumber } from '@/shared/theory/frequency'
import { pitchOf } from '@/shared/theory/pitch'

/** Equal temperament at A4 = 440 Hz (ISO 16), as published in tables of musical acoustics, to a hundredth of a hertz. */
test.each([
  ['A0', 27.5, 21],
  ['C2', 65.41, 36],
  ['E3', 164.81, 52],
  ['C4', 261.63, 60],
  ['F#4', 369.99, 66],
  ['A4', 440, 69],
  ['Bb4', 466.16, 70],
  ['B#4', 523.25, 72],
  ['C5', 523.25, 72],
  ['A5', 880, 81],
  ['C8', 4186.01, 108],
])('%s sounds at %d Hz', (name, hertz, midi) => {
  expect(frequencyHertz(pitchOf(name))).toBeCloseTo(hertz, 2)
  expect(midiNumber(pitchOf(name))).toBe(midi)
})
