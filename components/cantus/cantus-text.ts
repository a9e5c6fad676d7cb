import type { Clef } from '@/shared/theory/clef'
import { pitchAtPosition } from '@/shared/theory/clef'
import {
  diatonicNumber,
  formatPitch,
  HIGHEST_OCTAVE,
  letterIndex,
  LOWEST_OCTAVE,
  parsePitch,
  pitchOf,
  type Letter,
  type PitchName,
} from '@/shared/theory/pitch'

/** One word of a melody as it was typed, where it stands in the text, and the note it names; null for none. */
export type CantusToken = Readonly<{ text: string; start: number; end: number; pitch: PitchName | null }>

const SEPARATED = /[^\s,;|]+/g
const NOTE = /^([a-g])(##|𝄪|x|#|♯|bb|♭♭|𝄫|b|♭|♮|)([0-8]|)$/iu
const SIGNS: Readonly<Record<string, string>> = {
  '##': '##', '𝄪': '##', x: '##', '#': '#', '♯': '#', bb: 'bb', '♭♭': 'bb', '𝄫': 'bb', b: 'b', '♭': 'b', '♮': '', '': '',
} // prettier-ignore
/** Staff position that a first note without an octave stands nearest to: most melodies begin in the lower half. */
const FIRST_POSITION: Readonly<Record<Clef, number>> = {
  treble: 1,
  'treble-8vb': 1,
  alto: 1,
  tenor: 1,
  bass: 3,
}
const OCTAVE_STEPS = 7

/**
 * Reads a melody as people type it: `D4 F4 E4`, `d f e`, `d, f♯, e`. A note without an octave goes the nearer way from
 * the one before it; the first stands in the lower half of the staff.
 * @example parseCantusText('d f c', 'treble') // D4 F4 C4
 */
export function parseCantusText(text: string, clef: Clef): readonly CantusToken[] {
  let near = diatonicNumber(pitchAtPosition(FIRST_POSITION[clef], clef))
  return [...text.matchAll(SEPARATED)].map(({ 0: word, index }) => {
    const pitch = readNote(word, near)
    if (pitch) near = diatonicNumber(pitchOf(pitch))
    return { text: word, start: index, end: index + word.length, pitch }
  })
}

function readNote(word: string, near: number): PitchName | null {
  const match = NOTE.exec(word)
  if (!match) return null
  const [, letterText = '', sign = '', octaveText = ''] = match
  const letter = letterText.toUpperCase() as Letter
  const octave = octaveText === '' ? nearestOctave(letter, near) : Number(octaveText)
  const name = `${letter}${SIGNS[sign.toLowerCase()] ?? ''}${octave}`
  return parsePitch(name).ok ? name : null
}

function nearestOctave(letter: Letter, near: number): number {
  const octave = Math.floor((near - letterIndex(letter) + OCTAVE_STEPS / 2) / OCTAVE_STEPS)
  return Math.min(HIGHEST_OCTAVE, Math.max(LOWEST_OCTAVE, octave))
}

/** Writes a melody so that each note says its octave: what a staff or a key has changed is then independent of its neighbours. */
export const formatCantusText = (pitches: readonly string[]): string => pitches.join(' ')

const wordsOf = (tokens: readonly CantusToken[]): readonly string[] =>
  tokens.map(({ text, pitch }) => pitch ?? text)

/** Puts a note in a bar (from 1), or after the last; words that are no notes stay as they were typed. */
export function withNote(tokens: readonly CantusToken[], bar: number, pitch: PitchName): string {
  const words = [...wordsOf(tokens)]
  words[Math.min(bar - 1, words.length)] = pitch
  return formatCantusText(words)
}

/** Takes a bar's word out; the bars after it move up. */
export const withoutBar = (tokens: readonly CantusToken[], bar: number): string =>
  formatCantusText(wordsOf(tokens).filter((_, index) => index !== bar - 1))

/** Moves the note of a bar by staff places, keeping the letter's plain form in the signature `alterationOf` gives. */
export function withMovedNote(
  tokens: readonly CantusToken[],
  bar: number,
  places: number,
  alterationOf: (letter: Letter) => -2 | -1 | 0 | 1 | 2,
): string | null {
  const pitch = tokens[bar - 1]?.pitch
  if (!pitch) return null
  const steps = diatonicNumber(pitchOf(pitch)) + places
  const letter = 'CDEFGAB'[((steps % OCTAVE_STEPS) + OCTAVE_STEPS) % OCTAVE_STEPS] as Letter
  const octave = Math.floor(steps / OCTAVE_STEPS)
  if (octave < LOWEST_OCTAVE || octave > HIGHEST_OCTAVE) return null
  return withNote(tokens, bar, formatPitch({ letter, octave, alteration: alterationOf(letter) }))
}

/** Raises or lowers the note of a bar by a semitone on its own letter, at most to a double sign. */
export function withAlteredNote(tokens: readonly CantusToken[], bar: number, by: 1 | -1): string | null {
  const name = tokens[bar - 1]?.pitch
  if (!name) return null
  const pitch = pitchOf(name)
  const alteration = pitch.alteration + by
  if (alteration < -2 || alteration > 2) return null
  return withNote(tokens, bar, formatPitch({ ...pitch, alteration: alteration as -2 | -1 | 0 | 1 | 2 }))
}
