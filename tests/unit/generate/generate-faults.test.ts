import { generateFaults, MOST_FAULTS, prepareFaults, type Fault } from '@/shared/generate'
import { formatLineText } from '@/shared/interchange'
import { checkLine, createCore1, findPreset, readExercise, type Exercise, type RuleSet } from '@/shared/rules'
import { FUX_CANTUS } from '../rules/fux-cantus'

const SEEDS = 250
const FIRST_SEED = 20_261

const preset = (id: string) => findPreset(id) as RuleSet
const overFux = (mode: string, position: Exercise['position'] = 'above'): Exercise => {
  const cantus = FUX_CANTUS.find((known) => known.mode === mode)
  if (!cantus) throw new Error(`Fux has no cantus in ${mode}`)
  return readExercise({ ...cantus, cantus: cantus.notes.split(' '), species: 1, position })
}

type Case = readonly [name: string, Exercise, RuleSet, readonly Fault[], number]

const CASES: readonly Case[] = [
  ['one parallel', overFux('dorian'), preset('open-undergrad'), [{ rule: 'par-perfect', times: 1 }], 2],
  [
    'three dissonances, three bars apart',
    overFux('dorian'),
    preset('open-undergrad'),
    [{ rule: 'vert-consonance-set', times: 3 }],
    3,
  ],
  [
    'a parallel, a direct fifth and a leap without an answer',
    overFux('dorian'),
    preset('open-undergrad'),
    [
      { rule: 'par-perfect', times: 1 },
      { rule: 'dir-perfect', times: 1 },
      { rule: 'mel-leap-recovery', times: 1 },
    ],
    2,
  ],
  [
    'a fault told at the end of the line, below',
    overFux('phrygian', 'below'),
    preset('open-undergrad'),
    [
      { rule: 'mel-single-climax', times: 1 },
      { rule: 'vert-consonance-set', times: 1 },
    ],
    2,
  ],
  [
    'a leap of a seventh, which is two rules at one place',
    overFux('ionian'),
    preset('open-undergrad'),
    [
      { rule: 'mel-seventh', times: 1 },
      { rule: 'mel-interval-set', times: 1 },
    ],
    0,
  ],
  [
    'two parallels by Fux’s own rules, four bars apart',
    overFux('lydian'),
    preset('fux-mann'),
    [{ rule: 'par-perfect', times: 2 }],
    4,
  ],
  [
    'by the small exact rules',
    overFux('aeolian', 'below'),
    createCore1({ lowest: 'A2', highest: 'A4' }),
    [{ rule: 'dir-perfect', times: 2 }],
    3,
  ],
  [
    'a remark asked for as a fault',
    overFux('mixolydian'),
    preset('starter'),
    [
      { rule: 'vert-consonance-set', times: 1 },
      { rule: 'dist-max', times: 1 },
    ],
    2,
  ],
  [
    'two leaps without an answer, in halves',
    { ...overFux('dorian'), species: 2 },
    preset('open-undergrad'),
    [{ rule: 'mel-leap-recovery', times: 2 }],
    2,
  ],
  [
    'a parallel among suspensions',
    { ...overFux('dorian'), species: 4 },
    preset('open-undergrad'),
    [{ rule: 'par-perfect', times: 1 }],
    2,
  ],
]

describe.each(CASES)('%s', (_name, exercise, ruleSet, faults, apart) => {
  test(`exactly the faults asked for, of ${SEEDS} seeds from ${FIRST_SEED}`, () => {
    const source = prepareFaults({ exercise, ruleSet, faults, apart })
    if (!source.ok) throw new Error(source.reason.message)
    const lines = new Set<string>()
    for (let seed = FIRST_SEED; seed < FIRST_SEED + SEEDS; seed += 1) {
      const made = source.value.draw(seed)
      if (!made.ok) throw new Error(`seed ${seed}: ${made.reason.message}`)
      const { line, answerKey } = made.value
      const findings = checkLine(exercise, line, ruleSet)
      const told = findings.filter(
        ({ ruleId, level, isRemark }) =>
          level === 'law' || (!isRemark && faults.some(({ rule }) => rule === ruleId)),
      )
      expect(told).toEqual(answerKey)
      expect(told.map(({ ruleId }) => ruleId).sort()).toEqual(
        faults.flatMap(({ rule, times }) => Array.from({ length: times }, () => rule)).sort(),
      )
      const ends = told.map(({ bars }) => bars.at(-1) as number)
      for (const [index, end] of ends.entries()) {
        if (index > 0) expect(end - (ends[index - 1] as number)).toBeGreaterThanOrEqual(apart)
      }
      expect(Object.keys(line)).toHaveLength(exercise.cantus.length)
      lines.add(formatLineText(line))
    }
    // The draw is from all of them, and so does not come back to one line.
    expect(lines.size).toBeGreaterThan(Math.min(20, Number(source.value.count) / 3))
  })
})

test('the same seed makes the same exercise', () => {
  const [, exercise, ruleSet, faults, apart] = CASES[2] as Case
  const make = (seed: number) => generateFaults({ exercise, ruleSet, faults, apart, seed })
  expect(make(7)).toEqual(make(7))
  expect(make(7)).not.toEqual(make(8))
})

test('a message of a rule may be asked for', () => {
  const exercise = overFux('dorian')
  const ruleSet = preset('open-undergrad')
  const made = generateFaults({
    exercise,
    ruleSet,
    faults: [{ rule: 'par-perfect', times: 2, code: 'fifths' }],
    seed: 1,
  })
  if (!made.ok) throw new Error(made.reason.message)
  expect(made.value.answerKey.map(({ code }) => code)).toEqual(['fifths', 'fifths'])
})

describe('what cannot be made is refused in words', () => {
  const exercise = overFux('dorian')
  const ruleSet = preset('open-undergrad')
  const ask = (faults: readonly Fault[], apart = 2) =>
    generateFaults({ exercise, ruleSet, faults, apart, seed: 1 })

  test('a fault that always brings another, with the other’s name', () => {
    const made = ask([{ rule: 'mel-seventh', times: 1 }])
    expect(made).toMatchObject({ ok: false, reason: { code: 'impossible' } })
    if (!made.ok) {
      expect(made.reason.rules).toEqual(['mel-seventh', 'mel-interval-set'])
      expect(made.reason.message).toContain('Singable intervals only')
    }
  })

  test('faults too far apart for the cantus', () => {
    expect(ask([{ rule: 'vert-consonance-set', times: 3 }], 9)).toMatchObject({
      ok: false,
      reason: {
        code: 'impossible-together',
        message:
          '“Consonances only” cannot be broken 3 times in 11 bars, 9 bars apart, without another breach.',
      },
    })
  })

  test.each<[string, readonly Fault[], string]>([
    ['a rule nobody knows', [{ rule: 'no-such-rule', times: 1 }], 'rule-not-in-set'],
    ['a rule that is off', [{ rule: 'battuta-octave', times: 1 }], 'rule-not-in-set'],
    ['a rule of the cantus', [{ rule: 'cf-range', times: 1 }], 'rule-of-another-voice'],
    ['no fault at all', [], 'bad-request'],
    ['too many', [{ rule: 'par-perfect', times: MOST_FAULTS + 1 }], 'bad-request'],
    ['half a fault', [{ rule: 'par-perfect', times: 0.5 }], 'bad-request'],
    ['a message the rule has not', [{ rule: 'par-perfect', times: 1, code: 'x' }], 'bad-request'],
    [
      'a rule twice over',
      [
        { rule: 'par-perfect', times: 1 },
        { rule: 'par-perfect', times: 1 },
      ],
      'bad-request',
    ],
  ])('%s', (_name, faults, code) => {
    expect(ask(faults)).toMatchObject({ ok: false, reason: { code } })
  })

  test('a distance that is none', () => {
    expect(ask([{ rule: 'par-perfect', times: 1 }], -1)).toMatchObject({ reason: { code: 'bad-request' } })
  })
})
