import {
  parseCantusText,
  withAlteredNote,
  withMovedNote,
  withNote,
  withoutBar,
} from '@/components/cantus/cantus-text'
import type { Clef } from '@/shared/theory/clef'

const read = (text: string, clef: Clef = 'treble') => parseCantusText(text, clef).map(({ pitch }) => pitch)

describe('a melody typed as text', () => {
  test.each<[string, Clef, readonly (string | null)[]]>([
    ['D4 F4 E4 D4', 'treble', ['D4', 'F4', 'E4', 'D4']],
    ['d4,f4;e4|d4', 'treble', ['D4', 'F4', 'E4', 'D4']],
    // Without octaves each goes the nearer way; the first stands in the lower half of the staff.
    ['d f e d g f a g f e d', 'treble', 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' ')],
    ['d f', 'bass', ['D3', 'F3']],
    ['C4 G', 'treble', ['C4', 'G3']],
    ['C4 F', 'treble', ['C4', 'F4']],
    ['b bb Bb4 B♭3', 'treble', ['B4', 'Bb4', 'Bb4', 'Bb3']],
    ['C# c♯ cx F##4 E♮4', 'treble', ['C#4', 'C#4', 'C##4', 'F##4', 'E4']],
    ['D4 h4 E9 Dmaj7 4', 'treble', ['D4', null, null, null, null]],
    ['', 'treble', []],
    [' \n ', 'treble', []],
  ])('%j in the %s clef', (text, clef, expected) => {
    expect(read(text, clef)).toEqual(expected)
  })

  test('keeps the place of every word, so that a bad one can be pointed at', () => {
    expect(parseCantusText('D4  x9', 'treble')).toEqual([
      { text: 'D4', start: 0, end: 2, pitch: 'D4' },
      { text: 'x9', start: 4, end: 6, pitch: null },
    ])
  })
})

describe('changing a bar', () => {
  const tokens = parseCantusText('d4 f oops e', 'treble')

  test('writes octaves out, so that the notes after it stay where they were', () => {
    expect(withNote(tokens, 2, 'A5')).toBe('D4 A5 oops E4')
    expect(read(withNote(parseCantusText('d4 f e', 'treble'), 2, 'C6'))).toEqual(['D4', 'C6', 'E4'])
  })
  test('past the last bar adds one, never leaving a gap', () => {
    expect(withNote(tokens, 9, 'C4')).toBe('D4 F4 oops E4 C4')
    expect(withNote([], 3, 'C4')).toBe('C4')
  })
  test('takes a bar out', () => {
    expect(withoutBar(tokens, 3)).toBe('D4 F4 E4')
    expect(withoutBar(tokens, 9)).toBe('D4 F4 oops E4')
  })
  test('moves a note by staff places in the signature', () => {
    expect(withMovedNote(tokens, 2, 1, () => 0)).toBe('D4 G4 oops E4')
    expect(withMovedNote(tokens, 1, -2, () => -1)).toBe('Bb3 F4 oops E4')
    expect(withMovedNote(tokens, 3, 1, () => 0)).toBeNull()
    expect(withMovedNote(parseCantusText('C0', 'bass'), 1, -1, () => 0)).toBeNull()
  })
  test('alters a note on its own letter', () => {
    expect(withAlteredNote(tokens, 2, 1)).toBe('D4 F#4 oops E4')
    expect(withAlteredNote(parseCantusText('F##4', 'treble'), 1, 1)).toBeNull()
  })
})
