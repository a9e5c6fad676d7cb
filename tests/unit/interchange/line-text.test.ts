import fc from 'fast-check'
import {
  formatCantusWords,
  formatLineText,
  MAX_TEXT_CHARACTERS,
  parseCantusWords,
  parseLineText,
} from '@/shared/interchange'
import type { Line } from '@/shared/theory/note'
import { SEED } from '../rules/random-score'

const read = (text: string): Line => {
  const parsed = parseLineText(text)
  if (!parsed.ok) throw new Error(parsed.reason.message)
  return parsed.value
}

test('halves, a rest, a tie, a whole note', () => {
  expect(read('r:2 D4:2~ | D4:2 C#4:2 | D4:4')).toEqual({
    1: [
      { pitch: null, ticks: 960 },
      { pitch: 'D4', ticks: 960, tied: true },
    ],
    2: [
      { pitch: 'D4', ticks: 960 },
      { pitch: 'C#4', ticks: 960 },
    ],
    3: [{ pitch: 'D4', ticks: 1920 }],
  })
})

test.each([
  ['a note without a length is whole', 'A4 | G4', { 1: 1920, 2: 1920 }],
  ['without strokes a bar ends where it is full', 'A4:2 B4:2 G4:1 A4:1 B4:2', { 1: 960, 2: 480 }],
  ['a bar may be unwritten', 'A4 | . | | G4', { 1: 1920, 4: 1920 }],
  ['points stand for unwritten bars without strokes too', 'A4 . G4', { 1: 1920, 3: 1920 }],
  ['strokes round the whole are ornament', '| A4 | G4 |', { 1: 1920, 2: 1920 }],
  ['eighths and dots', 'A4:3 B4:0.5 C5:0.5', { 1: 1440 }],
])('%s', (_promise, text, firstTicks) => {
  const line = read(text)
  expect(Object.fromEntries(Object.entries(line).map(([bar, [note]]) => [bar, note!.ticks]))).toEqual(
    firstTicks,
  )
})

test.each([
  ['H4', 'not-a-note'],
  ['A9', 'not-a-note'],
  ['A4:x', 'not-a-note'],
  ['A4:0', 'off-the-grid'],
  ['A4:0.3', 'off-the-grid'],
  ['A4:1.33', 'off-the-grid'],
  ['A4:3 G4:2', 'bar-overfull'],
  ['A4:5', 'bar-overfull'],
  ['A4:2~ G4:2', 'no-such-tie'],
  ['A4:4~ | G4:4', 'no-such-tie'],
  ['r:2~ A4:2', 'no-such-tie'],
])('%s is refused: %s', (text, code) => {
  expect(parseLineText(text)).toMatchObject({ ok: false, reason: { code } })
})

test('a text beyond all measure is refused before it is read', () => {
  const parsed = parseLineText('A4 '.repeat(MAX_TEXT_CHARACTERS))
  expect(parsed).toMatchObject({ ok: false, reason: { code: 'too-long' } })
})

test('a refusal quotes what it refuses, short and on one line', () => {
  const parsed = parseLineText(`A4 | \u202e${'x'.repeat(100)}`)
  expect(parsed).toMatchObject({
    reason: {
      message: `“·${'x'.repeat(23)}…” in bar 2 is no note; a note is written like A4:2, a rest like r:2.`,
    },
  })
})

describe('a cantus in words', () => {
  test('reads, and is written again', () => {
    const parsed = parseCantusWords(' D4, F4 | E4  D4 ')
    expect(parsed.ok && formatCantusWords(parsed.value)).toBe('D4 F4 E4 D4')
  })

  test('lengths may be given when they are alike', () => {
    expect(parseCantusWords('D4:4 F4:4').ok).toBe(true)
    expect(parseCantusWords('D4:4 F4:2')).toMatchObject({ reason: { code: 'not-one-note-a-bar' } })
  })

  test.each([
    ['', 'empty'],
    ['D4 r', 'rest-in-cantus'],
    ['D4 Z4', 'not-a-note'],
  ])('%j is refused: %s', (text, code) => {
    expect(parseCantusWords(text)).toMatchObject({ ok: false, reason: { code } })
  })
})

const anyNote = (ticks: number) =>
  fc.constantFrom('r', 'C4', 'F#4', 'Bb4', 'A5').map((name) => ({ pitch: name === 'r' ? null : name, ticks }))
const anyBar = fc
  .constantFrom([1920], [960, 960], [480, 480, 480, 480], [1440, 480], [960, 240, 240, 480], [960])
  .chain((lengths) => fc.tuple(...lengths.map(anyNote)))

test(`what is written is read again (seed ${SEED})`, () => {
  fc.assert(
    fc.property(fc.array(fc.option(anyBar, { nil: undefined }), { minLength: 2, maxLength: 12 }), (bars) => {
      const line = Object.fromEntries(bars.flatMap((bar, index) => (bar ? [[index + 1, bar]] : [])))
      expect(read(formatLineText(line, bars.length))).toEqual(line)
    }),
    { seed: SEED, numRuns: 500 },
  )
})
