import { judgeExample } from '@/shared/rules/example'
import { findRule } from '@/shared/rules/registry'
import type { Example } from '@/shared/rules/rule'
import type { Mode } from '@/shared/theory/mode'
import { FUX_CANTUS } from './fux-cantus'

/** What a rule says of a melody: last bar and code of each breach, `*` where it is only a remark. */
function verdict(ruleId: string, notes: string, more: Partial<Example> = {}): string {
  const rule = findRule(ruleId)
  if (!rule) throw new Error(`There is no rule ${ruleId}.`)
  const example: Example = { cantus: notes, mode: 'dorian', final: 'D', breaches: [], ...more }
  return judgeExample(rule, example)
    .map(({ bars, code, isRemark }) => `${bars.at(-1)} ${code}${isRemark ? '*' : ''}`)
    .join(', ')
}

type Row = readonly [notes: string, expected: string, params?: Example['params'], more?: Partial<Example>]

const TABLES: Readonly<Record<string, readonly Row[]>> = {
  'cf-length': [
    ['D4 F4 E4 D4 G4 F4 E4 D4', ''],
    ['D4 F4 E4 D4 F4 E4 D4', '7 too-short'],
    ['D4 F4 E4 D4 F4 E4 D4', '', { least: 7 }],
    ['D4 F4 E4 D4 F4 E4 D4', '7 too-long', { least: 3, most: 5 }],
  ],
  'cf-note-values': [
    ['D4 F4 E4 D4', ''],
    ['D4:2,E4:2 F4 E4 D4', '1 not-whole, 1 not-whole'],
    ['D4 r E4 D4', '2 not-whole'],
    ['D4 . E4 D4', ''],
    ['D4~ D4 E4 D4', '1 not-whole'],
  ],
  'cf-start-final': [
    ['D3 F4 E4 D4', ''],
    ['A4 F4 E4 D4', '1 not-on-final'],
    ['A4 F4 E4 D4', '', { allowDominant: true }],
    ['Ab4 F4 E4 D4', '1 not-on-final', { allowDominant: true }],
    ['D#4 F4 E4 D4', '1 not-on-final'],
    ['. F4 E4 D4', ''],
  ],
  'cf-end-final': [
    ['D4 F4 E4 D4', ''],
    ['D4 F4 G4 A4', '4 not-on-final'],
    ['D4 F4 E4 D5', ''],
    ['D4 F4 G4 .', ''],
  ],
  'cf-approach-final': [
    ['D4 F4 E4 D4', ''],
    ['D4 E4 C4 D4', '', { direction: 'either' }],
    ['D4 E4 C4 D4', '4 from-below', { direction: 'above' }],
    ['D4 E4 F4 D4', '4 not-by-step'],
    ['D4 E4 D4 D4', '4 not-by-step'],
    ['D4 E4 . D4', ''],
  ],
  'cf-range': [
    ['D4 D5 C5 D4', '', { most: 8 }],
    ['D4 E5 D5 D4', '2 too-wide', { most: 8 }],
    ['D4 E5 F5 G5 D4', '2 rather-wide*, 4 too-wide', { most: 10, preferred: 8 }],
    ['D4 G5 D4', '2 too-wide', { most: 10, preferred: 8 }],
    ['D4 E4 . F5 . G5', '6 too-wide'],
    ['D4 . . .', ''],
  ],
  'mel-single-climax': [
    ['D4 F4 E4 G4 F4 E4 D4', ''],
    ['D4 G4 E4 G4 F4 E4 D4', '4 peak-again'],
    ['D4 G4 G4 F4 E4 D4', '3 peak-again'],
    ['D4 G4 E4 G4 F4 . D4', ''],
    ['D4 G4 C4 G4 F4 E4 D4', '', { extreme: 'either' }],
    ['D4 G4 D4 G4 F4 E4 D4', '4 peak-again', { extreme: 'either' }],
    ['D4 A4 C4 G4 C4 E4 D4', '5 trough-again', { extreme: 'both' }],
    ['D4 A4 C4 G4 C4 E4 D4', '', { extreme: 'either' }],
    ['D4 F4 E4 D4', '', { extreme: 'low-below' }, { line: 'D3 A3 C3 A3', position: 'below' }],
    ['D4 F4 E4 D4', '4 peak-again', { extreme: 'low-below' }, { line: 'D4 A4 C4 A4', position: 'above' }],
  ],
  'mel-climax-place': [
    ['D4 F4 E4 D4', ''],
    ['A4 F4 E4 D4', '1 at-the-edge'],
    ['D4 F4 A4 D4', '3 at-the-edge'],
    ['D4 F4 A4 D4', '', { allowPenultimate: true }],
    ['D4 F4 E4 G4', '4 at-the-edge'],
    ['A4 F4 A4 F4 D4', '1 at-the-edge'],
    ['A4 F4 . F4 D4', ''],
  ],
  'mel-interval-set': [
    ['D4 E4 G4 C4 G4 D4 D5 D4', ''],
    ['E4 C5 E4', '3 down'],
    ['E4 C5 E4', '', { set: 'no-major-sixth' }],
    ['D4 B4 D4', '2 up, 3 down', { set: 'no-major-sixth' }],
    ['D4 B4 D4', '', { set: 'consonances' }],
    ['D4 B4 D4', '', { leaveSixths: true }],
    ['D4 C5 B4 F4', '2 up, 4 down', { set: 'consonances' }],
    ['B3 F4 B3', '2 up, 3 down'],
    ['B3 F4 B3', '', { diminishedFifth: true }],
    ['B3 F4 B4', '3 up', { set: 'broad' }],
    ['F4 F#4 F4', '2 same-letter, 3 same-letter'],
    ['D4 E5', '2 up', { set: 'broad' }],
    ['D4 . C5', ''],
    ['D4 D4 D4', ''],
  ],
  'mel-sixth-leap': [
    ['E4 C5 B4', ''],
    ['C5 E4 F4', '2 minor-down'],
    ['C5 E4 F4', '', { minorDown: true }],
    ['D4 B4 D4', '2 major, 3 major'],
    ['D4 B4 D4', '', { major: 'yes' }],
    ['D4:2,B4:2 A4', '', { major: 'inside-bar' }],
    ['D4:2,B4:2 A4', '1 major*', { major: 'inside-bar-as-remark' }],
    ['D4 B4 A4', '2 major', { major: 'inside-bar' }],
  ],
  'mel-seventh': [
    ['D4 D5 D4', ''],
    ['D4 C5 D4', '2 seventh, 3 seventh'],
    ['D4 E5', '2 beyond-octave'],
    ['E4:2,D5:2 C5', '', { minorInsideBar: true }],
    ['E4 D5 C5', '2 seventh', { minorInsideBar: true }],
    ['C4:2,B4:2 C5', '1 seventh', { minorInsideBar: true }],
  ],
  'mel-aug-dim': [
    ['F4 A4 B4 C5', ''],
    ['F4 B4 C5', '2 augmented'],
    ['B3 F4 E4', '2 diminished'],
    ['B3 F4 E4', '', { diminished: 'fifth-turned-back' }],
    ['B3 F4 G4', '3 diminished', { diminished: 'fifth-turned-back' }],
    ['B3 F4', '2 diminished', { diminished: 'fifth-turned-back' }],
    ['B3 F4 .', '', { diminished: 'fifth-turned-back' }],
    ['F4 C#4 D4', '2 diminished', { diminished: 'fifth-turned-back' }],
    ['F4 C#4 D4', '', { diminished: 'turned-back' }],
    ['F4 G#4 A4', '2 augmented', { diminished: 'turned-back' }],
    ['D4 D#5 E5', '2 augmented'],
    ['F4 F#4 G4', ''],
  ],
  'mel-chromatic-step': [
    ['F4 F#4 G4', '2 chromatic'],
    ['B4 Bb4 A4', '2 chromatic'],
    ['F4 F#5 G5', ''],
    ['F4 F4 G4', ''],
  ],
  'mel-leap-recovery': [
    ['D4 A4 G4', ''],
    ['D4 A4 F4', ''],
    ['D4 A4 F4', '3 step', { answer: 'step' }],
    ['D4 A4 F4', '', { answer: 'step-or-third' }],
    ['D4 A4 E4', '3 step-or-third', { answer: 'step-or-third' }],
    ['D4 A4 B4', '3 opposite'],
    ['D4 A4 A4', '3 opposite'],
    ['D4 G4 A4', ''],
    ['D4 G4 A4', '3 step', { threshold: 4, answer: 'step' }],
    ['D4 E4 A4 B4', '4 opposite', { threshold: 4 }],
    ['D4 E4 A4 B4', '', { threshold: 4, excusePenultimate: true }],
    ['D4 A4 . B4', ''],
    ['D4 E4 A4', ''],
  ],
  'mel-leap-approach': [
    ['E4 D4 A4', ''],
    ['C4 D4 A4', '3 opposite'],
    ['F4 D4 A4', ''],
    ['F4 D4 A4', '3 step', { by: 'step' }],
    ['C4 D4 G4', ''],
    ['C4 D4 G4', '3 opposite', { threshold: 4 }],
    ['D4 A4 G4', ''],
    ['D4 D4 A4', '3 opposite'],
  ],
  'mel-leap-run': [
    ['D4 F4 D4 E4 G4', ''],
    ['D4 F4 D4 F4 E4', '4 too-many'],
    ['D4 F4 D4 F4 D4 F4', '4 too-many'],
    ['D4 F4 D4 F4 E4', '', { sameDirection: true }],
    ['D4 F4 A4 C5 B4', '4 too-many', { sameDirection: true }],
    ['D4 F4 E4', '', { most: 1 }],
    ['D4 F4 D4', '3 too-many', { most: 1 }],
    ['D4 F4 . F4 D4 F4', ''],
    ['D4 F4 F4 D4 F4', ''],
    ['D4 F4 D4 F4 E4 G4 E4 G4', '4 too-many, 8 too-many'],
  ],
  'mel-leaps-same-direction': [
    ['D4 F4 D4', ''],
    ['D4 F4 A4', '3 up'],
    ['A4 F4 D4', '3 down'],
    ['D4 F4 A4', '', { allow: 'triad' }],
    ['D4 F4 B4', '3 up', { allow: 'triad' }],
    ['D4 F4 Bb4', '', { allow: 'triad' }],
    ['B3 D4 F4', '3 up', { allow: 'triad' }],
    ['D4 F4 B4', '', { allow: 'small' }],
    ['D4 F4 C5', '3 up', { allow: 'small' }],
    ['D4 F4 A4', '3 up', { allow: 'minor-thirds-or-fourths' }],
    ['B3 D4 F4', '', { allow: 'minor-thirds-or-fourths' }],
    ['D4 G4 C5 B4', '', { allow: 'minor-thirds-or-fourths' }],
    ['D4 G4 C5 D5', '3 up', { allow: 'minor-thirds-or-fourths' }],
    ['D4 G4 C5', '3 up', { allow: 'minor-thirds-or-fourths' }],
    ['D4 G4 C5 .', '', { allow: 'minor-thirds-or-fourths' }],
    ['D4 F4 . A4', ''],
    ['D4 F4 F4 A4', ''],
  ],
  'mel-two-leap-span': [
    ['D4 F4 A4', ''],
    ['D4 G4 C5', '3 seventh'],
    ['D4 A4 C5', ''],
    ['D4 A4 C5', '3 seventh', { allowFifthThenThird: false }],
    ['C4 G4 B4', '3 seventh'],
    ['D4 A4 D5', ''],
    ['D4 A4 E5', '3 beyond-octave'],
    ['C5 G4 D4', '3 seventh'],
    ['D4 G4 A4', ''],
  ],
  'mel-tritone-outline': [
    ['A4 F4 G4 A4 B4 G4 F4 E4 D4', '5 augmented-fourth'],
    ['A4 F4 G4 B4 B4 A4', '5 augmented-fourth'],
    ['F4 G4 A4 B4', '4 augmented-fourth'],
    ['F4 F4 G4 A4 B4', '5 augmented-fourth'],
    ['F4 G4 A4 B4 C5 A4', ''],
    ['D4 B3 D4 F4 E4 D4', '4 diminished-fifth*'],
    ['D4 B3 D4 F4 E4 D4', '', { diminishedFifth: 'allow' }],
    ['D4 B3 D4 F4 E4 D4', '4 diminished-fifth', { diminishedFifth: 'ban' }],
    ['G4 . F4 G4 A4 B4 A4', ''],
    ['F4 G4 A4 B4 .', ''],
    ['F4 A4 F4 B4', '4 augmented-fourth'],
  ],
  'mel-seventh-outline': [
    ['D4 F4 A4 C5 A4', '4 outlined'],
    ['D4 F4 A4 D5 A4', ''],
    ['D4 A4 D5 E5 D5 C5', '4 outlined'],
    ['E5 D4 E4', '2 outlined'],
  ],
  'mel-step-majority': [
    ['D4 F4 E4 D4', ''],
    ['D4 F4 E4 G4 F4', '4 too-few'],
    ['D4 F4 E4 G4 F4', '', { percent: 50, isInclusive: true }],
    ['D4 F4 E4 D4 C4 D4', '', { percent: 60, isInclusive: true }],
    ['D4 F4 E4 G4 F4 E4', '4 too-few', { percent: 60 }],
    ['D4 D4 D4', ''],
    ['D4 F4 . G4 E4', ''],
  ],
  'mel-some-leaps': [
    ['D4 F4 E4 D4', ''],
    ['D4 E4 F4 E4 D4', '5 too-few'],
    ['D4 F4 E4 D4', '4 too-few', { least: 2 }],
    ['D4 E4 . E4 D4', ''],
  ],
  'mel-run-one-direction': [
    ['D4 E4 F4 G4 A4 B4 A4', ''],
    ['D4 E4 F4 G4 A4 B4 C5', '7 rising'],
    ['C5 B4 A4 G4 F4 E4 D4 C4', '7 falling'],
    ['D4 E4 F4 F4 G4 A4 B4 C5', ''],
    ['D4 E4 F4 G4', '4 rising', { most: 3 }],
    ['D4 E4 F4 G4 . A4 B4 C5', ''],
  ],
  'mel-no-repeat-cf': [
    ['D4 F4 E4 D4', ''],
    ['D4 F4 F4 D4', '3 repeated'],
    ['D4 F4 . F4 D4', ''],
    ['D4 F4 F5 D4', ''],
  ],
  'mel-motive-repeat': [
    ['D4 F4 E4 D4 F4 E4 D4', '6 again'],
    ['D4 F4 E4 G4 D4 F4 E4', '7 again'],
    ['D4 F4 E4 G4 D4 F4 G4', ''],
    ['D4 F4 E4 D4 F4 E4 G4', '', { notes: 4 }],
    ['D4 F4 E4 D4 F4 E4 D4', '7 again', { notes: 4 }],
    ['D4 F4 E4 . F4 E4 D4', ''],
  ],
  'mel-sequence': [
    ['D4 F4 E4 F4 A4 G4', '6 sequence'],
    ['D4 E4 F4 G4 A4 B4 C5 D5', ''],
    ['D4 E4 F4 E4 F4 G4', '6 sequence'],
    ['D4 F4 E4 G4 E4 G4 F4 A4', '8 sequence'],
    ['D4 F4 E4 D4 F4 E4', ''],
    ['D4 F4 E4 . A4 G4', ''],
  ],
  'mel-circling': [
    ['F4 E4 F4 G4 A4', ''],
    ['F4 E4 F4 G4 F4', '5 hovers'],
    ['F4 E4 F4 E4 F4 E4 F4', '5 hovers, 6 hovers'],
    ['F4 D4 F4 D4 F4', ''],
    ['F4 E4 F4 D4', '3 hovers', { strikes: 2 }],
    ['F4 E4 F4 . F4', ''],
  ],
  'mel-leading-tone': [
    ['C4 B3 C4', '', undefined, { mode: 'ionian', final: 'C' }],
    ['C4 B3 A3', '3 unresolved', undefined, { mode: 'ionian', final: 'C' }],
    ['C4 B3 A3', '', { excuseDescent: true }, { mode: 'ionian', final: 'C' }],
    ['D4 B3 A3', '3 unresolved', { excuseDescent: true }, { mode: 'ionian', final: 'C' }],
    ['C4 B3 B3 C4', '', undefined, { mode: 'ionian', final: 'C' }],
    ['C4 B3 . A3', '', undefined, { mode: 'ionian', final: 'C' }],
    ['C4 B3', '', undefined, { mode: 'ionian', final: 'C' }],
    ['E4 D4 C4', '', undefined, { mode: 'phrygian', final: 'E' }],
    ['D4 C#4 E4', '3 unresolved'],
    ['D4 C4 B3', ''],
  ],
  'mel-minor-degrees': [
    ['A4 G#4 A4', '', undefined, { mode: 'aeolian', final: 'A' }],
    ['A4 G#4 A4 B4 A4', '2 seventh', undefined, { mode: 'aeolian', final: 'A' }],
    ['E4 F#4 G#4 A4', '', undefined, { mode: 'aeolian', final: 'A' }],
    ['E4 F#4 E4 A4', '3 sixth', undefined, { mode: 'aeolian', final: 'A' }],
    ['E4 F#4', '2 sixth', undefined, { mode: 'aeolian', final: 'A' }],
    ['E4 F#4 . A4', '', undefined, { mode: 'aeolian', final: 'A' }],
    ['A4 G#4 A4 B4 A4', '', { where: 'rising' }, { mode: 'aeolian', final: 'A' }],
    ['A4 G#4 F#4 E4', '3 falls, 4 falls', { where: 'rising' }, { mode: 'aeolian', final: 'A' }],
    ['D5 C#5 D5', ''],
    ['C#5 D5 C5 D5', '1 seventh'],
    ['E4 D#4 E4', '', undefined, { mode: 'phrygian', final: 'E' }],
  ],
  'cf-diatonic': [
    ['D4 B4 A4 D4', ''],
    ['D4 Bb4 A4 D4', '2 foreign'],
    ['D4 C#4 D4', '2 foreign'],
    ['G3 Bb3 A3 G3', '', undefined, { mode: 'dorian', final: 'G' }],
    ['G3 B3 A3 G3', '2 foreign', undefined, { mode: 'dorian', final: 'G' }],
  ],
  'mel-leap-order': [
    ['D4 G4 A4', ''],
    ['D4 E4 A4', '3 rising'],
    ['A4 G4 D4', ''],
    ['A4 E4 D4', '3 falling'],
    ['D4 F4 A4', ''],
    ['D4 E4 F4', ''],
    ['D4 G4 D4', ''],
  ],
  'mel-triad-outline': [
    ['D4 F4 A4', '3 triad'],
    ['F4 D4 A4', '3 triad'],
    ['D4 F4 D4', ''],
    ['D4 F4 A4', '', { most: 3 }],
    ['D4 F4 A4 D5', '4 triad', { most: 3 }],
    ['D4 F4 A4 C5', '3 triad, 4 triad'],
    ['D4 F4 G4 A4', ''],
    ['D4 F4 . A4', ''],
  ],
  'mel-arch': [
    ['D4 F4 E4 D4', ''],
    ['D4 E4 F4 G4', '4 no-arch'],
    ['A4 G4 F4 D4', '4 no-arch'],
    ['D4 C4 E4 D4', ''],
    ['A4 D4 A4', ''],
    ['D4 F4 E4 G4 F4 A4 G4 F4', '7 zigzag'],
    ['D4 F4 E4 G4 F4 A4 B4 A4', ''],
    ['D4 E4 F4 .', ''],
  ],
  'voice-compass': [
    ['D4 E4 D4', '', undefined, { line: 'C4 A5 C4' }],
    ['D4 E4 D4', '1 below, 2 above', undefined, { line: 'B3 B5 D4' }],
    ['D4 E4 D4', '1 above', undefined, { line: 'E4 D4 D2', position: 'below' }],
    ['D4 E4 D4', '', { span: 8 }, { line: 'D4 D5 D4' }],
    ['D4 E4 D4', '2 too-wide', { span: 8 }, { line: 'D4 E5 D4' }],
    ['D4 E4 D4', '2 above, 2 too-wide', { span: 8, aboveHigh: 'D5' }, { line: 'D4 E5 D4' }],
    ['D4 E4 D4', '2 above', { aboveLow: 'D4', aboveHigh: 'D5' }, { line: 'D4 D#5 D4' }],
  ],
}

describe.each(Object.entries(TABLES))('%s', (ruleId, rows) => {
  const cases = rows.map(([notes, expected, params, more]) => ({ notes, expected, params, more }))
  test.each(cases)('$notes with $params: $expected', ({ notes, expected, params, more }) => {
    expect(verdict(ruleId, notes, { ...(params && { params }), ...more })).toBe(expected)
  })
})

test('every rule of a line has its table of accepted and refused melodies', () => {
  const outcomes = Object.values(TABLES).map((rows) => [
    rows.some(([, expected]) => expected === ''),
    rows.some(([, expected]) => expected !== ''),
  ])
  expect(outcomes).toEqual(outcomes.map(() => [true, true]))
  expect(Object.keys(TABLES)).toHaveLength(34)
})

test('rests are passed over, and a tie is one note', () => {
  const more: Partial<Example> = { species: 2, line: 'r:2,D4:2~ D4:2,A4:2 B4 D5' }
  expect(verdict('mel-leap-recovery', 'D4 F4 E4 D4', more)).toBe('3 opposite')
})

test('Fux’s canti firmi have the departures that the catalogue knows', () => {
  const bars = (ruleId: string, index: number, params: Example['params'] = {}): string => {
    const { mode, final, notes } = FUX_CANTUS[index] as { mode: Mode; final: string; notes: string }
    return verdict(ruleId, notes, { mode, final, params })
  }
  // Fux F and G break the strict form of the rule on two leaps in one direction; Fux G fails every majority of steps.
  expect(bars('mel-leaps-same-direction', 2)).not.toBe('')
  expect(bars('mel-leaps-same-direction', 3)).not.toBe('')
  expect(bars('mel-step-majority', 3)).not.toBe('')
  for (const index of FUX_CANTUS.keys()) expect(bars('mel-single-climax', index)).toBe('')
  for (const index of FUX_CANTUS.keys()) expect(bars('cf-range', index, { most: 8 })).toBe('')
})
