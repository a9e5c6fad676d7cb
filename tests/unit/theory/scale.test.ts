import { Mode as TonalMode, Note } from 'tonal'
import { MODES, type Mode } from '@/shared/theory/mode'
import {
  formatPitch,
  formatPitchClass,
  LETTERS,
  parsePitchClass,
  pitchClassOf,
  pitchOf,
  type PitchClass,
} from '@/shared/theory/pitch'
import { signatureAlteration, signatureOf } from '@/shared/theory/key'
import {
  degreeOf,
  isDiatonic,
  isFinal,
  isLeadingTone,
  isRaisedSeventh,
  leadingToneOf,
  raisesSeventh,
  scaleBetween,
  scaleOf,
} from '@/shared/theory/scale'
import { EVERY_PITCH } from './every-pitch'

const FINALS: readonly PitchClass[] = LETTERS.flatMap((letter) =>
  ([-1, 0, 1] as const).map((alteration) => ({ letter, alteration })),
)
const CASES = MODES.flatMap((mode) => FINALS.map((final) => [mode, formatPitchClass(final), final] as const))

test.each(CASES)('%s on %s is tonal’s scale', (mode, _name, final) => {
  const theirs = TonalMode.notes(mode, formatPitchClass(final))
  const ours = scaleOf(mode, final)
  if (theirs.some((note) => /###|bbb/.test(note))) expect(ours).toEqual({ ok: false, reason: 'no-spelling' })
  else expect(ours.ok && ours.value.map(formatPitchClass)).toEqual(theirs)
})

test.each(CASES)('in %s on %s a pitch is diatonic just when it is in the scale', (mode, _name, final) => {
  const scale = scaleOf(mode, final)
  if (!scale.ok) return
  const names = new Set(scale.value.map(formatPitchClass))
  for (const pitch of EVERY_PITCH) {
    expect([formatPitch(pitch), isDiatonic(pitch, mode, final)]).toEqual([
      formatPitch(pitch),
      names.has(formatPitchClass(pitch)),
    ])
    expect(degreeOf(pitch, final)).toBe(
      ((LETTERS.indexOf(pitch.letter) - LETTERS.indexOf(final.letter) + 7) % 7) + 1,
    )
  }
})

test.each(CASES)('the signature of %s on %s spells its scale', (mode, _name, final) => {
  const signature = signatureOf(mode, final)
  const scale = scaleOf(mode, final)
  if (signature === null || !scale.ok) {
    // Beyond seven accidentals a note of the scale has a double one.
    if (scale.ok) expect(scale.value.some(({ alteration }) => Math.abs(alteration) === 2)).toBe(true)
    return
  }
  for (const { letter, alteration } of scale.value)
    expect(signatureAlteration(signature, letter)).toBe(alteration)
})

test('modes keep their intervals on every final', () => {
  const home: Readonly<Record<Mode, string>> = {
    ionian: 'C',
    dorian: 'D',
    phrygian: 'E',
    lydian: 'F',
    mixolydian: 'G',
    aeolian: 'A',
  }
  for (const mode of MODES) {
    const plain = scaleOf(mode, pitchClassOf(home[mode]))
    expect(plain.ok && plain.value.every(({ alteration }) => alteration === 0)).toBe(true)
    expect(signatureOf(mode, pitchClassOf(home[mode]))).toBe(0)
  }
})

/** Common practice, no source; the raised sevenths are those of the rule catalogue. */
test.each<[Mode, string, string, boolean]>([
  ['dorian', 'D', 'C#', true],
  ['mixolydian', 'G', 'F#', true],
  ['aeolian', 'A', 'G#', true],
  ['ionian', 'C', 'B', false],
  ['lydian', 'F', 'E', false],
  ['phrygian', 'E', 'D', false],
  ['dorian', 'A', 'G#', true],
  ['aeolian', 'C', 'B', true],
  ['aeolian', 'G#', 'F##', true],
])('%s on %s closes through %s', (mode, finalName, leading, isRaised) => {
  const final = pitchClassOf(finalName)
  expect(formatPitchClass(leadingToneOf(mode, final) as PitchClass)).toBe(leading)
  expect(raisesSeventh(mode)).toBe(isRaised)
  expect(isLeadingTone(pitchClassOf(leading), mode, final)).toBe(true)
  expect(isRaisedSeventh(pitchClassOf(leading), mode, final)).toBe(isRaised)
  expect(isDiatonic(pitchClassOf(leading), mode, final)).toBe(!isRaised)
})

test('there is one leading tone among all spelled pitches of an octave', () => {
  for (const mode of MODES) {
    const final = pitchClassOf('D')
    const leading = EVERY_PITCH.filter(({ octave }) => octave === 4).filter((pitch) =>
      isLeadingTone(pitch, mode, final),
    )
    expect(leading).toHaveLength(1)
    const halfSteps = (14 - (Note.chroma(formatPitch(leading[0]!)) as number)) % 12
    expect(halfSteps).toBe(mode === 'phrygian' ? 2 : 1)
  }
})

test('a ladder of pitches holds the mode’s notes from rung to rung', () => {
  const ladder = scaleBetween('dorian', pitchClassOf('G'), pitchOf('G3'), pitchOf('B4'))
  expect(ladder.map(formatPitch)).toEqual(['G3', 'A3', 'Bb3', 'C4', 'D4', 'E4', 'F4', 'G4', 'A4', 'Bb4'])
})

test('the final is a matter of spelling', () => {
  expect(isFinal(pitchOf('C#3'), pitchClassOf('C#'))).toBe(true)
  expect(isFinal(pitchOf('Db3'), pitchClassOf('C#'))).toBe(false)
})

test.each(['', 'H', 'c', 'C###', 'C4', 'B♭'])('what is no pitch class is refused: %j', (text) => {
  expect(parsePitchClass(text)).toEqual({ ok: false, reason: 'not-a-pitch-class' })
})
