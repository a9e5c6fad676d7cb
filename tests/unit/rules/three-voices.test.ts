import {
  checkThreeVoices,
  findPreset,
  judgeExample,
  readExample,
  type Example,
  type RuleSet,
} from '@/shared/rules'
import { describeFinding } from '@/shared/rules/describe'
import { readTrio } from '@/shared/rules/reading'
import { THREE_VOICE_RULES } from '@/shared/rules/three-voices'

type Row = readonly [
  line: string,
  second: string,
  bars: readonly number[],
  shows: string,
  more?: Partial<Pick<Example, 'cantus' | 'mode' | 'final' | 'params'>>,
]

const LINE = 'A4 A4 C#5 D5'
const SECOND = 'D5 C5 G4 A4'

/** Accepted and rejected scores over `D4 F4 E4 D4`. Common practice where the catalogue's sources give no example. */
const CASES: Readonly<Record<string, readonly Row[]>> = {
  'v3-bass-consonance': [
    [LINE, SECOND, [], 'thirds, fifths, sixths, octaves'],
    ['A4 D5 C#5 D5', 'F4 Bb4 G4 A4', [], 'a six-four is another rule’s matter'],
    ['A4 . C#5 D5', 'D5 G4 G4 A4', [], 'a chord that is not whole yet'],
    ['A4 B4 C#5 D5', SECOND, [2], 'an augmented fourth'],
    ['A4 A4 C#5 D5', 'D5 Bb4 G4 A4', [2], 'a fourth without a sixth'],
    ['A3 A4 C#5 D5', 'G3 C5 G4 A4', [1], 'a second over a line that is the lowest'],
  ],
  'v3-upper-fourth': [
    [LINE, SECOND, [], 'a fourth and an augmented fourth'],
    ['D5 A4 C#5 D5', 'F4 C5 G4 A4', [], 'sixths'],
    ['A4 C5 C#5 D5', 'F4 D5 G4 A4', [2], 'a second'],
    [LINE, SECOND, [1, 3, 4], 'fourths, where none are used', { params: { granted: false } }],
    ['A4 A4 G5 D5', 'D5 C5 C#5 A4', [3], 'a diminished fifth, as a remark'],
    [
      'A4 A4 G5 D5',
      'D5 C5 C#5 A4',
      [],
      'a diminished fifth, where it is free',
      { params: { diminishedFifth: 'free' } },
    ],
  ],
  'v3-six-four': [
    [LINE, SECOND, [], 'none'],
    ['A4 D5 C#5 D5', 'F4 Bb4 G4 A4', [2], 'inside'],
    ['A4 A4 C5 D5', 'D5 C5 A4 A4', [3], 'in the last bar but one'],
    ['A4 A4 C5 D5', 'D5 C5 A4 A4', [], 'the same, where it is let pass', { params: { cadential: true } }],
  ],
  'v3-diminished-triad': [
    [LINE, SECOND, [], 'on its third'],
    ['A4 A4 C5 D5', 'D5 C5 G4 A4', [], 'a minor triad'],
    ['G4 D5 F4 D5', 'B4 A4 D5 F5', [3], 'on its root', { cantus: 'E4 F4 B3 D4' }],
    ['A4 D5 C5 D5', 'D5 B4 G4 A4', [2], 'on its fifth'],
  ],
  'v3-complete-triad': [
    [LINE, SECOND, [], 'full inside'],
    ['A4 F5 C#5 D5', SECOND, [2], 'a doubled bass'],
    [LINE, SECOND, [1, 4], 'the ends, where they are to be full', { params: { endsMayBeEmpty: false } }],
    ['A4 . C#5 D5', SECOND, [], 'not written yet'],
  ],
  'v3-doubling': [
    [LINE, SECOND, [], 'the root'],
    ['A4 A4 C#5 D5', 'F4 A5 G4 A4', [2], 'a major third'],
    ['A4 A4 C#5 D5', 'F4 C5 C#6 A4', [3], 'the leading tone'],
    ['F4 A4 C#5 D5', 'F5 C5 G4 A4', [], 'a minor third'],
  ],
  'v3-unison': [
    [LINE, SECOND, [], 'none'],
    ['D4 A4 C#5 D5', 'D4 C5 G4 D5', [], 'at the ends'],
    ['A4 F4 C#5 D5', SECOND, [2], 'with the cantus'],
    ['A4 C5 C#5 D5', SECOND, [2], 'between the lines'],
  ],
  'v3-parallels-all-pairs': [
    [LINE, SECOND, [], 'none'],
    ['A4 C5 C#5 D5', 'F4 A4 G4 F#4', [2], 'fifths with the cantus'],
    ['D5 F5 E5 D5', 'F4 A4 G4 F#4', [2, 3, 4], 'octaves with the cantus'],
    ['D4 A4 C#5 D5', 'A4 E5 G4 A4', [2], 'fifths between the lines'],
    ['A4 A4 C#5 D5', 'A4 A4 G4 A4', [], 'notes that are repeated'],
    ['A4 . C#5 D5', 'D5 C5 G4 A4', [], 'over a gap'],
  ],
  'v3-direct-relaxed': [
    [LINE, SECOND, [], 'none'],
    ['F4 C5 C#5 D5', 'D4 A4 G4 A4', [2], 'a fifth, all three rising'],
    ['F4 C5 C#5 D5', 'D5 A4 G4 A4', [], 'a fifth, the third voice falling'],
    ['F4 C5 C#5 D5', 'D5 A4 G4 A4', [2], 'the same, where it is strict', { params: { strict: true } }],
    ['D5 C5 C#5 D5', 'F5 C5 G4 A4', [2], 'a unison'],
  ],
  'v3-all-same-direction': [
    [LINE, SECOND, [], 'one against the others'],
    ['A4 C5 C#5 D5', 'F4 A4 G4 F#4', [2], 'rising'],
    ['A4 C5 B4 D5', 'D5 A4 G4 A4', [3], 'falling'],
  ],
  'v3-open': [
    [LINE, SECOND, [], 'final and fifth'],
    ['F4 A4 C#5 D5', 'F5 C5 G4 A4', [], 'final and third'],
    ['B4 C5 C#5 D5', SECOND, [1], 'a sixth'],
    ['A3 C5 C#5 D5', SECOND, [1], 'the fifth in the bass'],
  ],
  'v3-close': [
    [LINE, SECOND, [], 'fifth and octave'],
    ['A4 A4 C#5 D5', 'D5 C5 G4 F#4', [], 'a raised third'],
    ['A4 A4 C#5 D5', 'D5 C5 G4 F4', [4], 'a minor third'],
    ['A4 A4 C#5 B4', SECOND, [4], 'a sixth'],
    ['A4 A4 C#5 A3', SECOND, [4], 'the fifth in the bass'],
  ],
  'v3-spacing': [
    [LINE, SECOND, [], 'close together'],
    ['A5 A5 C#5 D5', 'F4 A4 G4 D4', [], 'a tenth once'],
    ['D6 A5 C#5 D5', 'F4 A4 G4 D4', [1], 'a thirteenth'],
    ['A5 C6 C#6 D5', 'F4 A4 A4 D4', [3], 'tenths for too long'],
  ],
}

const exampleOf = ([line, second, breaches, , more]: Row): Example => ({
  cantus: 'D4 F4 E4 D4',
  line,
  second,
  mode: 'dorian',
  final: 'D',
  ...more,
  breaches,
})

test('every rule of three voices has its accepted and its rejected cases', () => {
  for (const { id } of THREE_VOICE_RULES) {
    const rows = CASES[id] ?? []
    const accepted = rows.filter(([, , bars]) => bars.length === 0).length
    expect([id, accepted >= 1, rows.length - accepted >= 2]).toEqual([id, true, true])
  }
  expect(Object.keys(CASES).sort()).toEqual(THREE_VOICE_RULES.map(({ id }) => id).sort())
})

describe.each(THREE_VOICE_RULES.map((rule) => [rule.id, rule] as const))('%s', (id, rule) => {
  const rows = CASES[id] ?? []

  test.each(rows.map((row) => [row[2].length === 0 ? 'accepts' : 'rejects', row[3], row] as const))(
    '%s: %s',
    (_verdict, _shows, row) => {
      expect(judgeExample(rule, exampleOf(row)).map(({ bars }) => bars.at(-1))).toEqual(row[2])
    },
  )

  test('puts every finding in words, and has no message that nothing can say', () => {
    const breaches = rows.flatMap((row) => judgeExample(rule, exampleOf(row)))
    for (const breach of breaches) {
      const told = describeFinding({ ...breach, ruleId: id, level: rule.level, voice: 'line' })
      for (const text of [told.sentence, told.mend]) expect(text).toMatch(/^[A-Z][^{}!]*\.$/)
    }
    expect([...new Set(breaches.map(({ code }) => code))].sort()).toEqual(
      Object.keys(rule.explain.messages).sort(),
    )
  })

  test('gives equal keys only to states that say the same of whatever follows', () => {
    const notes = ['A4', 'C5', 'D5', 'F4', '.']
    for (const row of rows) {
      const example = exampleOf(row)
      const [lineRest, secondRest] = [row[0], row[1]].map((text) => text.split(' ').slice(2).join(' '))
      const known = new Map<number, string>()
      for (const line of notes) {
        for (const second of notes) {
          const { key, said } = futureOf(rule, {
            ...example,
            line: `A4 ${line} ${lineRest}`,
            second: `F4 ${second} ${secondRest}`,
          })
          const other = known.get(key) ?? said
          expect(`${line} ${second} ${said}`).toBe(`${line} ${second} ${other}`)
          known.set(key, said)
        }
      }
    }
  })
})

/** The key after two bars, and what is said of the rest. */
function futureOf(rule: (typeof THREE_VOICE_RULES)[number], example: Example) {
  const { exercise, line, second } = readExample(example)
  const params: unknown = rule.params.parse(example.params ?? {})
  let state: unknown = rule.start(exercise, params, 'line')
  let key = 0
  const said: string[] = []
  for (const moment of readTrio(exercise, [line, second])) {
    if (moment.bar === 3) key = rule.key(state)
    const next = rule.step(state, moment, params)
    state = next.state
    if (next.breach && moment.bar > 2) said.push(`${moment.bar} ${next.breach.code}`)
  }
  return { key, said: said.join(', ') }
}

describe('a score of three voices', () => {
  const judge = (line: string, second: string, preset: string, setAside: readonly number[] = []) => {
    const read = readExample(exampleOf([line, second, [], '']))
    return checkThreeVoices(read.exercise, [read.line, read.second], findPreset(preset) as RuleSet, {
      setAside: new Set(setAside),
    })
      .filter(({ level }) => level === 'law')
      .map(({ ruleId, voice, bars }) => `${ruleId} ${voice} ${bars.join(',')}`)
  }

  test('that is right breaks no law', () => {
    expect(judge(LINE, SECOND, 'fux-mann')).toEqual([])
    expect(judge('A4 . C#5 .', '. C5 . .', 'fux-mann')).toEqual([])
    expect(judge('. . . .', '. . . .', 'fux-mann')).toEqual([])
  })

  test('is judged as chords, and each line as a melody under its own name', () => {
    expect(judge('A4 G#4 C#5 D5', SECOND, 'fux-mann')).toContain('v3-bass-consonance line 2')
    expect(judge(LINE, 'D5 C5 D4 A4', 'fux-mann')).toContain('mel-seventh second 2,3')
    expect(judge('D5 C5 D4 A4', LINE, 'fux-mann')).toContain('mel-seventh line 2,3')
  })

  test('leaves out bars that are set aside', () => {
    expect(judge('A4 B4 C#5 D5', SECOND, 'fux-mann')).toContain('v3-bass-consonance line 2')
    expect(judge('A4 B4 C#5 D5', SECOND, 'fux-mann', [2])).not.toContain('v3-bass-consonance line 2')
  })

  test('is not asked the rules of two voices, nor two voices those of three', () => {
    const asked = judge('A4 G#4 C#5 A4', SECOND, 'fux-mann').filter((finding) => finding.startsWith('vert-'))
    expect(asked).toEqual([])
  })
})
