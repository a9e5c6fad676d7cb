import { analyseCantus, type CantusAnalysis } from '@/shared/theory/analyse-cantus'
import { findCantusProblems } from '@/shared/theory/cantus-problems'
import type { Clef } from '@/shared/theory/clef'
import { findGestures } from '@/shared/theory/gestures'
import { formatInterval } from '@/shared/theory/interval-name'
import type { Mode } from '@/shared/theory/mode'
import { formatPitch, formatPitchClass, pitchClassOf, pitchOf } from '@/shared/theory/pitch'
import { FUX_CANTUS } from '../rules/fux-cantus'

const read = (notes: string) => (notes === '' ? [] : notes.split(' ').map(pitchOf))
const analyse = (notes: string, mode: Mode, final: string): CantusAnalysis =>
  analyseCantus(read(notes), { mode, final: pitchClassOf(final) })!

test('Fux’s Dorian cantus, in every respect', () => {
  const analysis = analyse('D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4', 'dorian', 'D')
  expect(formatPitchClass(analysis.final)).toBe('D')
  expect(analysis).toMatchObject({
    length: 11,
    modes: ['dorian', 'aeolian'],
    fitsDeclared: true,
    apexBars: [7],
    steps: 7,
    repeats: 0,
    stepShare: 0.7,
    cadence: [2, 1],
  })
  expect([analysis.lowest, analysis.highest].map(formatPitch)).toEqual(['D4', 'A4'])
  expect(formatInterval(analysis.range)).toBe('P5')
  expect(
    analysis.leaps.map(({ bar, interval, direction, recovery }) => [
      bar,
      formatInterval(interval),
      direction,
      recovery,
    ]),
  ).toEqual([
    [2, 'm3', 1, 'step-back'],
    [5, 'P4', 1, 'step-back'],
    [7, 'M3', 1, 'step-back'],
  ])
  expect(analysis.gestures.map(({ from, to, shape }) => [from, to, shape])).toEqual([
    [1, 4, 'arch'],
    [5, 11, 'arch'],
  ])
})

test.each(FUX_CANTUS.map(({ mode, final, notes }) => [mode, final, notes] as const))(
  'Fux’s %s cantus on %s fits its mode, closes 2–1 and has one apex',
  (mode, final, notes) => {
    const analysis = analyse(notes, mode, final)
    expect(analysis.modes).toContain(mode)
    expect(analysis.fitsDeclared).toBe(true)
    expect(analysis.cadence).toEqual([2, 1])
    expect(analysis.apexBars).toHaveLength(1)
  },
)

test('Fux’s canti firmi have from 38 to 75 per cent steps, as the catalogue says', () => {
  const shares = FUX_CANTUS.map(({ mode, final, notes }) => analyse(notes, mode, final).stepShare as number)
  expect(Math.round(100 * Math.min(...shares))).toBe(38)
  expect(Math.max(...shares)).toBeLessThanOrEqual(0.75)
})

test('gestures cover the melody without gaps, each of three bars or more', () => {
  for (const { notes } of FUX_CANTUS) {
    const gestures = findGestures(read(notes))
    expect(gestures[0]?.from).toBe(1)
    expect(gestures.at(-1)?.to).toBe(read(notes).length)
    gestures.forEach(({ from, to }, index) => {
      expect(to - from).toBeGreaterThanOrEqual(2)
      if (index > 0) expect(from).toBe(gestures[index - 1]!.to + 1)
    })
  }
})

test.each([
  ['D4 E4', []],
  ['D4 E4 F4', [[1, 3, 'rise']]],
  ['A4 G4 F4', [[1, 3, 'fall']]],
  ['D4 D4 D4', [[1, 3, 'level']]],
  ['F4 D4 G4', [[1, 3, 'valley']]],
  [
    'G3 C4 B3 G3 C4 E4 D4 G4 E4 C4 D4 B3 A3 G3',
    [
      [1, 4, 'arch'],
      [5, 7, 'arch'],
      [8, 10, 'fall'],
      [11, 14, 'fall'],
    ],
  ],
])('gestures of %s', (notes, expected) => {
  expect(findGestures(read(notes)).map(({ from, to, shape }) => [from, to, shape])).toEqual(expected)
})

test('how each leap is answered', () => {
  const { leaps } = analyse('D4 A4 G4 C5 A4 D5 D5 F4 G4 C4', 'dorian', 'D')
  expect(leaps.map(({ bar, recovery }) => [bar, recovery])).toEqual([
    [2, 'step-back'],
    [4, 'turns-back'],
    [5, 'turns-back'],
    [6, 'none'],
    [8, 'step-back'],
    [10, 'end'],
  ])
})

test('a note foreign to the mode, or another final, does not fit the declared mode', () => {
  expect(analyse('D4 F#4 E4 D4', 'dorian', 'D').fitsDeclared).toBe(false)
  expect(analyse('D4 F4 E4 D4', 'aeolian', 'A').fitsDeclared).toBe(false)
  expect(analyse('D4 F#4 E4 D4', 'dorian', 'D').modes).toEqual(['mixolydian', 'ionian', 'lydian'])
  expect(analyse('D4 G#4 Ab4 D4', 'dorian', 'D').modes).toEqual([])
})

test('the smallest melodies have an analysis too', () => {
  expect(analyseCantus([], { mode: 'dorian', final: pitchClassOf('D') })).toBeNull()
  expect(analyse('D4', 'dorian', 'D')).toMatchObject({
    length: 1,
    cadence: null,
    stepShare: null,
    apexBars: [1],
    gestures: [],
  })
})

test.each<[string, Clef, readonly (readonly [string, readonly number[]])[]]>([
  ['D4 F4 E4 D4', 'treble', []],
  ['D4 D4', 'treble', [['too-short', [2]]]],
  ['', 'treble', [['too-short', []]]],
  ['D4 E4 F4 E4 F4 E4 D4', 'treble', [['too-long', [7]]]],
  ['D4 F4 E4 F4', 'treble', [['wrong-final', [4]]]],
  ['D4 C#4 Eb4 D4', 'treble', [['not-diatonic', [2, 3]]]],
  ['D3 F3 E3 D4', 'treble', [['out-of-clef-range', [1, 2, 3]]]],
  ['D3 F3 E3 D3', 'bass', []],
])('what is wrong with %j in the %s clef', (notes, clef, expected) => {
  const problems = findCantusProblems(read(notes), {
    mode: 'dorian',
    final: pitchClassOf('D'),
    clef,
    least: 3,
    most: 6,
  })
  expect(problems.map(({ code, bars }) => [code, bars])).toEqual(expected)
})
