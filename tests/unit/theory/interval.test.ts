import { Interval as TonalInterval, Note as TonalNote } from 'tonal'
import {
  directionFrom,
  figureOf,
  intervalBetween,
  isConsonant,
  isImperfectConsonance,
  isPerfectConsonance,
  qualityOf,
  semitonesFrom,
  simpleInterval,
  stepsFrom,
  type Interval,
} from '@/shared/theory/interval'
import { formatInterval, intervalOf, nameInterval, parseInterval } from '@/shared/theory/interval-name'
import { formatPitch, pitchOf, type Pitch } from '@/shared/theory/pitch'
import { transpose } from '@/shared/theory/transpose'
import { EVERY_PITCH } from './every-pitch'

describe('every pair of spelled pitches in four octaves, against tonal', () => {
  test('has tonal’s letters and half steps', () => {
    const place = (pitch: Pitch) => {
      const { step, oct, height } = TonalNote.get(formatPitch(pitch))
      return { staff: step + 7 * (oct as number), height }
    }
    for (const a of EVERY_PITCH) {
      for (const b of EVERY_PITCH) {
        const [from, to] = [place(a), place(b)]
        expect([formatPitch(a), formatPitch(b), stepsFrom(a, b), semitonesFrom(a, b)]).toEqual([
          formatPitch(a),
          formatPitch(b),
          to.staff - from.staff,
          to.height - from.height,
        ])
      }
    }
  })

  // Where letters and sound part (B♯♯3 is written below C4 and sounds above it) tonal names another interval.
  test('has tonal’s name wherever the higher letter does not sound lower', () => {
    let named = 0
    for (const a of EVERY_PITCH) {
      for (const b of EVERY_PITCH) {
        const interval = intervalBetween(a, b)
        if (directionFrom(a, b) < 0 || interval.semitones < 0) continue
        const theirs = TonalInterval.get(TonalInterval.distance(formatPitch(a), formatPitch(b)))
        // Quintuply augmented is beyond its words.
        if (theirs.empty && /^(A|d){5}/.test(formatInterval(interval))) continue
        named += 1
        expect([formatPitch(a), formatPitch(b), formatInterval(interval), interval.semitones]).toEqual([
          formatPitch(a),
          formatPitch(b),
          `${theirs.q}${theirs.num}`,
          theirs.semitones,
        ])
      }
    }
    expect(named).toBeGreaterThan(9700)
  })

  test('leads from one to the other by transposition, up and down', () => {
    for (const a of EVERY_PITCH) {
      for (const b of EVERY_PITCH) {
        const interval = intervalBetween(a, b)
        const direction = directionFrom(a, b) === -1 ? -1 : 1
        expect(transpose(a, interval, direction)).toEqual({ ok: true, value: b })
      }
    }
  })
})

/** tonal puts the number first: `3m`. */
const theirName = (name: string): string => name.slice(1) + name.charAt(0)

test('transposing every pitch by every simple interval agrees with tonal', () => {
  const names = [
    'P1',
    'm2',
    'M2',
    'm3',
    'M3',
    'P4',
    'A4',
    'd5',
    'P5',
    'm6',
    'M6',
    'm7',
    'M7',
    'P8',
    'A2',
    'd7',
    'M10',
    'P12',
  ]
  for (const pitch of EVERY_PITCH) {
    for (const name of names) {
      for (const direction of [1, -1] as const) {
        const theirs = TonalNote.transpose(formatPitch(pitch), (direction < 0 ? '-' : '') + theirName(name))
        const ours = transpose(pitch, intervalOf(name), direction)
        const isSpelled = !/###|bbb/.test(theirs)
        const label = [formatPitch(pitch), name, direction]
        expect([...label, ours.ok ? formatPitch(ours.value) : ours.reason]).toEqual([
          ...label,
          isSpelled ? theirs : 'no-spelling',
        ])
      }
    }
  }
})

test('transposition stays on the keyboard', () => {
  expect(transpose(pitchOf('B8'), intervalOf('m2'))).toEqual({ ok: false, reason: 'out-of-range' })
  expect(transpose(pitchOf('C0'), intervalOf('m2'), -1)).toEqual({ ok: false, reason: 'out-of-range' })
})

/**
 * Size and quality to half steps, as tabulated in Open Music Theory, “Intervals and dyads”, and in common use. The
 * table is written from memory of it.
 */
const PUBLISHED: readonly (readonly [
  name: string,
  semitones: number,
  kind: 'perfect' | 'imperfect' | 'dissonant',
])[] = [
  ['P1', 0, 'perfect'],
  ['m2', 1, 'dissonant'],
  ['M2', 2, 'dissonant'],
  ['m3', 3, 'imperfect'],
  ['M3', 4, 'imperfect'],
  ['P4', 5, 'dissonant'],
  ['A4', 6, 'dissonant'],
  ['d5', 6, 'dissonant'],
  ['P5', 7, 'perfect'],
  ['A5', 8, 'dissonant'],
  ['m6', 8, 'imperfect'],
  ['M6', 9, 'imperfect'],
  ['d7', 9, 'dissonant'],
  ['m7', 10, 'dissonant'],
  ['M7', 11, 'dissonant'],
  ['P8', 12, 'perfect'],
  ['m9', 13, 'dissonant'],
  ['M9', 14, 'dissonant'],
  ['m10', 15, 'imperfect'],
  ['M10', 16, 'imperfect'],
  ['P11', 17, 'dissonant'],
  ['P12', 19, 'perfect'],
  ['m13', 20, 'imperfect'],
  ['M13', 21, 'imperfect'],
  ['P15', 24, 'perfect'],
]

test.each(PUBLISHED)('%s has %i half steps and is %s between two voices', (name, semitones, kind) => {
  const interval = intervalOf(name)
  expect(interval.semitones).toBe(semitones)
  expect(formatInterval(interval)).toBe(name)
  expect(isPerfectConsonance(interval)).toBe(kind === 'perfect')
  expect(isImperfectConsonance(interval)).toBe(kind === 'imperfect')
  expect(isConsonant(interval)).toBe(kind !== 'dissonant')
})

test.each([
  ['C4', 'E4', 'major third'],
  ['E4', 'C4', 'major third'],
  ['D4', 'D4', 'unison'],
  ['D4', 'D5', 'octave'],
  ['D4', 'D#4', 'augmented unison'],
  ['F4', 'B4', 'augmented fourth'],
  ['B3', 'F4', 'diminished fifth'],
  ['G#3', 'F4', 'diminished seventh'],
  ['D4', 'F5', 'minor tenth'],
  ['C4', 'G5', 'perfect twelfth'],
  ['Cb4', 'F#4', 'doubly augmented fourth'],
  ['C3', 'C5', 'perfect fifteenth'],
  ['C2', 'D5', 'major 23rd'],
])('%s and %s make a %s', (a, b, name) => {
  expect(nameInterval(intervalBetween(pitchOf(a), pitchOf(b)))).toBe(name)
})

test('compound intervals reduce to simple ones, and octaves to unisons', () => {
  const simple = (name: string): Interval => simpleInterval(intervalOf(name))
  expect(simple('M10')).toEqual(intervalOf('M3'))
  expect(simple('P12')).toEqual(intervalOf('P5'))
  expect(simple('P8')).toEqual(intervalOf('P1'))
  expect(simple('P15')).toEqual(intervalOf('P1'))
  expect(simple('m7')).toEqual(intervalOf('m7'))
})

test('the rail’s figure is the plain number, compound as it stands', () => {
  expect(['P1', 'm3', 'P5', 'P8', 'M10', 'P12'].map((name) => figureOf(intervalOf(name)))).toEqual([
    '1',
    '3',
    '5',
    '8',
    '10',
    '12',
  ])
})

test('quality goes as far as the spelling does', () => {
  expect(qualityOf(intervalBetween(pitchOf('Fbb4'), pitchOf('B##4')))).toBe('AAAAA')
  expect(qualityOf(intervalBetween(pitchOf('F##4'), pitchOf('Cbb5')))).toBe('dddd')
})

test.each(['', 'm1', 'P3', 'M5', 'm4', 'd1', 'X3', 'P0', 'P5 ', '5P', 'm100', 'AAAAA4'])(
  'what is no interval is refused: %j',
  (text) => {
    expect(parseInterval(text)).toEqual({ ok: false, reason: 'not-an-interval' })
  },
)
