import { fail, ok, type Result } from '@/shared/result'

/** Letters from C upward: an octave begins at C, as in scientific pitch notation. */
export const LETTERS = ['C', 'D', 'E', 'F', 'G', 'A', 'B'] as const
export type Letter = (typeof LETTERS)[number]

/** Semitones of each letter above C, in the order of `LETTERS`. */
const LETTER_SEMITONES = [0, 2, 4, 5, 7, 9, 11] as const

/** Sharps (positive) or flats (negative) before a letter, at most two. */
export type Alteration = -2 | -1 | 0 | 1 | 2

/** A pitch class with its spelling, without an octave: the final of a mode, a key. */
export type PitchClass = Readonly<{ letter: Letter; alteration: Alteration }>

/** A spelled pitch. C♯4 and D♭4 sound alike and are two pitches. */
export type Pitch = PitchClass & Readonly<{ octave: number }>

/** The written form of a pitch, such as `C#4`, `Bb3`, `F##5`: what documents and requests carry. */
export type PitchName = string & Readonly<{ __brand?: 'PitchName' }>

export const LOWEST_OCTAVE = 0
export const HIGHEST_OCTAVE = 8

const ALTERATION_SIGNS: Readonly<Record<string, Alteration>> = { bb: -2, b: -1, '': 0, '#': 1, '##': 2 }
const SIGN_OF_ALTERATION: Readonly<Record<Alteration, string>> = {
  [-2]: 'bb',
  [-1]: 'b',
  0: '',
  1: '#',
  2: '##',
}
const PITCH_GRAMMAR = /^([A-G])(##|#|bb|b|)([0-8])$/

const PITCH_CLASS_GRAMMAR = /^([A-G])(##|#|bb|b|)$/

/** Place of a letter above C: 0 for C to 6 for B. Worked out from the letter's code, as rules ask for it all the time. */
export const letterIndex = (letter: Letter): number => (letter.charCodeAt(0) + 3) % 7

/** Semitones of a letter above C. */
export const letterSemitones = (letter: Letter): number => LETTER_SEMITONES[letterIndex(letter)] as number

/** Position on the ladder of letters, seven to the octave: C4 is 28, D4 29. A staff place, whatever the accidental. */
export const diatonicNumber = (pitch: Pitch): number => 7 * pitch.octave + letterIndex(pitch.letter)

/** Position in semitones, twelve to the octave: C4 is 48. MIDI's number is this plus 12. */
export const chromaticNumber = (pitch: Pitch): number =>
  12 * pitch.octave + letterSemitones(pitch.letter) + pitch.alteration

/** Reads `C#4`. Anything else is refused with the text that was given. */
export function parsePitch(text: string): Result<Pitch, 'not-a-pitch'> {
  const match = PITCH_GRAMMAR.exec(text)
  if (!match) return fail('not-a-pitch')
  const [, letter, sign, octave] = match
  return ok({
    letter: letter as Letter,
    alteration: ALTERATION_SIGNS[sign as string] as Alteration,
    octave: Number(octave),
  })
}

/** Reads `C#`, `Bb`, `F`: a pitch class without an octave. */
export function parsePitchClass(text: string): Result<PitchClass, 'not-a-pitch-class'> {
  const match = PITCH_CLASS_GRAMMAR.exec(text)
  if (!match) return fail('not-a-pitch-class')
  return ok({
    letter: match[1] as Letter,
    alteration: ALTERATION_SIGNS[match[2] as string] as Alteration,
  })
}

/** The pitch class a literal in code or in trusted data names. Throws on anything else. */
export function pitchClassOf(name: string): PitchClass {
  const parsed = parsePitchClass(name)
  if (!parsed.ok) throw new RangeError(`Not a pitch class: ${JSON.stringify(name)}`)
  return parsed.value
}

/** The pitch a literal in code or in trusted data names. Throws on anything that is no pitch. */
export function pitchOf(name: PitchName): Pitch {
  const parsed = parsePitch(name)
  if (!parsed.ok) throw new RangeError(`Not a pitch: ${JSON.stringify(name)}`)
  return parsed.value
}

export const formatPitchClass = ({ letter, alteration }: PitchClass): string =>
  letter + SIGN_OF_ALTERATION[alteration]

/** Writes a pitch as `C#4`; the inverse of `parsePitch`. */
export const formatPitch = (pitch: Pitch): PitchName => formatPitchClass(pitch) + String(pitch.octave)

/** Orders pitches by staff place, then by accidental: negative when `a` is below `b`, 0 only for the same spelling. */
export const comparePitches = (a: Pitch, b: Pitch): number =>
  diatonicNumber(a) - diatonicNumber(b) || a.alteration - b.alteration

export const isSamePitch = (a: Pitch, b: Pitch): boolean => comparePitches(a, b) === 0
