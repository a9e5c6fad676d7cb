import {
  checkLine,
  findPreset,
  judgeExample,
  readExample,
  type Breach,
  type Example,
  type RuleSet,
} from '@/shared/rules'
import { describeFinding } from '@/shared/rules/describe'
import { FIRST_SPECIES_RULES } from '@/shared/rules/first-species'
import { readMoments, readVoice } from '@/shared/rules/reading'
import type { AnyRule } from '@/shared/rules/rule'
import { CASES, type Row } from './first-species-cases'

const exampleOf = ([cantus, line, breaches, , more]: Row): Example => ({
  cantus,
  line,
  mode: 'dorian',
  final: 'D',
  ...more,
  breaches,
})

const judge = (rule: AnyRule, row: Row): readonly Breach[] => judgeExample(rule, exampleOf(row))
const rows = FIRST_SPECIES_RULES.map((rule) => [rule.id, rule] as const)

test('every rule of two voices has its accepted and its rejected cases', () => {
  for (const [id] of rows) {
    const cases = CASES[id] ?? []
    const accepted = cases.filter(([, , bars]) => bars.length === 0).length
    expect([id, accepted >= 2, cases.length - accepted >= 2]).toEqual([id, true, true])
  }
  expect(Object.keys(CASES).sort()).toEqual(rows.map(([id]) => id).sort())
})

describe.each(rows)('%s', (id, rule) => {
  const cases = CASES[id] ?? []

  test.each(cases.map((row) => [row[2].length === 0 ? 'accepts' : 'rejects', row[3], row] as const))(
    '%s: %s',
    (_verdict, _shows, row) => {
      expect(judge(rule, row).map(({ bars }) => bars.at(-1))).toEqual(row[2])
    },
  )

  test('shows a right example that a teacher could stand by', () => {
    const { exercise, line } = readExample(rule.explain.right)
    const broken = checkLine(exercise, line, findPreset('fux-mann') as RuleSet).filter(
      ({ level }) => level === 'law',
    )
    expect(broken).toEqual([])
  })

  test('points at bars and notes that exist and are written, and puts every finding in words', () => {
    for (const row of cases) {
      const { line } = readExample(exampleOf(row))
      for (const breach of judge(rule, row)) {
        expect(breach.bars).toEqual([...new Set(breach.bars)].sort((a, b) => a - b))
        for (const bar of breach.bars) expect(line[bar]).toBeDefined()
        for (const { bar } of breach.notes) expect(breach.bars).toContain(bar)
        expect(Object.keys(rule.explain.messages)).toContain(breach.code)
        const told = describeFinding({ ...breach, ruleId: id, level: rule.level, voice: 'line' })
        for (const text of [told.sentence, told.mend]) expect(text).toMatch(/^[A-Z][^{}!]*\.$/)
      }
    }
  })

  test('has no message that nothing can say, as far as the cases reach', () => {
    const said = new Set(cases.flatMap((row) => judge(rule, row).map(({ code }) => code)))
    const sayable = Object.keys(rule.explain.messages).filter((code) => !code.endsWith('.mend'))
    expect(sayable.filter((code) => !said.has(code))).toEqual([])
  })

  test('gives equal keys only to states that say the same of whatever follows', () => {
    for (const row of cases) expectKeysToHold(rule, row)
  })
})

/** Folds pairs of beginnings of one length; where their keys agree, the rest of the row must be judged alike. */
function expectKeysToHold(rule: AnyRule, row: Row): void {
  const example = exampleOf(row)
  const params: unknown = rule.params.parse(example.params ?? {})
  const bars = example.cantus.split(' ').length
  const written = (example.line as string).split(' ')
  for (let cut = 1; cut < bars; cut += 1) {
    const byKey = new Map<number, string>()
    for (const variant of variantsOf(written, cut)) {
      const line = variant.join(' ')
      const whole = { ...example, line }
      const key = keyAfter(rule, whole, cut, params)
      const rest = JSON.stringify(saidAfter(rule, whole, cut))
      const known = byKey.get(key)
      if (known === undefined) byKey.set(key, rest)
      else
        expect(`${rule.id} ${example.cantus} | ${line} | ${cut} ${rest}`).toBe(
          `${rule.id} ${example.cantus} | ${line} | ${cut} ${known}`,
        )
    }
  }
}

/** The row with other notes in the two bars before the cut; what comes after stays. */
function variantsOf(written: readonly string[], cut: number): readonly (readonly string[])[] {
  const others = ['D4', 'F4', 'A4', 'D5', 'E5', 'B3', '.']
  const variants: string[][] = [[...written]]
  for (const last of others) {
    for (const before of cut > 1 ? others : ['']) {
      const variant = [...written]
      variant[cut - 1] = last
      if (cut > 1) variant[cut - 2] = before
      variants.push(variant)
    }
  }
  return variants
}

function momentsOf(rule: AnyRule, example: Example) {
  const { exercise, line, barCount } = readExample(example)
  return {
    exercise,
    moments: rule.scope === 'pair' ? readMoments(exercise, line) : readVoice(barCount, line),
  }
}

function keyAfter(rule: AnyRule, example: Example, cut: number, params: unknown): number {
  const { exercise, moments } = momentsOf(rule, example)
  let state: unknown = rule.start(exercise, params, 'line')
  for (const moment of moments) {
    if (moment.bar <= cut) state = (rule.step(state, moment, params) as { state: unknown }).state
  }
  return rule.key(state)
}

function saidAfter(rule: AnyRule, example: Example, cut: number): readonly string[] {
  // A breach of the whole line is told at the end, whatever bars it points at; it has to agree as well.
  const { exercise, moments } = momentsOf(rule, example)
  const params: unknown = rule.params.parse(example.params ?? {})
  const said: string[] = []
  let state: unknown = rule.start(exercise, params, 'line')
  for (const moment of moments) {
    const next = rule.step(state, moment, params) as { state: unknown; breach: Breach | null }
    state = next.state
    if (next.breach && moment.bar > cut) said.push(`${moment.bar} ${next.breach.code}`)
  }
  const last = rule.finish(state, params, true)
  if (last) said.push(`end ${last.code}`)
  return said
}

/** What a rule says of a row: its messages, with `?` behind a remark. */
const saidOf = (id: string, cantus: string, line: string, params: Readonly<Record<string, unknown>>) => {
  const rule = FIRST_SPECIES_RULES.find((one) => one.id === id)
  if (!rule) throw new Error(`There is no rule called ${id}`)
  return judge(rule, [cantus, line, [], '', { params }]).map(
    ({ code, isRemark }) => code + (isRemark ? '?' : ''),
  )
}

describe('a remark within a law', () => {
  test.each([
    ['s1-open-above', 'D4', 'D4', { set: ['fifth'], secondBest: ['unison'] }, ['second-best?']],
    ['s1-open-above', 'D4', 'D5', { set: ['fifth'], secondBest: ['unison'] }, ['not-allowed']],
    ['dist-max', 'D4 D4', 'F5 G5', { preferred: 10, beyondPreferred: 0 }, ['far?']],
    ['dist-max', 'D4 D4', 'F5 B5', { preferred: 10, beyondPreferred: 0 }, ['too-far']],
    ['rel-tritone', 'F4 G4', 'A4 B4', { bothStep: 'remark' }, ['against?']],
    ['rel-tritone', 'F4 G4', 'A4 B4', { bothStep: 'judged' }, ['against']],
    ['rel-tritone', 'F4 D4', 'A4 B4', { bothStep: 'remark' }, ['against']],
  ] as const)('%s: %s against %s', (id, cantus, line, params, said) => {
    expect(saidOf(id, cantus, line, params)).toEqual(said)
  })
})

test('a repetition is told as what it is: none allowed, one too many, too long a row', () => {
  expect(saidOf('s1-repeat', 'D4 F4', 'A4 A4', { maxRepeats: 0 })).toEqual(['never'])
  expect(saidOf('s1-repeat', 'D4 F4 E4', 'A4 A4 A4', { maxRepeats: 1 })).toEqual(['too-many'])
  expect(saidOf('s1-repeat', 'D4 F4 E4', 'A4 A4 A4', { maxRepeats: 9, maxInRow: 2 })).toEqual(['in-a-row'])
})

describe('bars set aside', () => {
  const lawOf = (id: string, params: Readonly<Record<string, unknown>> = {}) => ({
    id: 'one',
    name: 'One rule',
    rules: { [id]: { level: 'law' as const, params } },
  })
  const found = (
    id: string,
    example: Omit<Example, 'breaches' | 'mode' | 'final'>,
    aside: readonly number[],
  ) => {
    const { exercise, line } = readExample({ mode: 'dorian', final: 'D', ...example, breaches: [] })
    return checkLine(exercise, line, lawOf(id), { setAside: new Set(aside) }).map(({ bars }) => bars)
  }

  test('make neighbours of the bars around them', () => {
    const example = { cantus: 'D4 E4 F4 E4 D4', line: 'A4 G4 C5 C#5 D5' }
    expect(found('par-perfect', example, [])).toEqual([])
    expect(found('par-perfect', example, [2])).toEqual([[1, 3]])
  })

  test('take their own faults with them', () => {
    const example = { cantus: 'D4 F4 E4 D4', line: 'A4 G4 C#5 D5' }
    expect(found('vert-consonance-set', example, [])).toEqual([[2]])
    expect(found('vert-consonance-set', example, [2])).toEqual([])
  })

  test('make another bar the first, and another the last but one', () => {
    const example = { cantus: 'D4 F4 E4 F4 D4', line: 'A4 A4 C#5 A4 D5' }
    expect(found('s1-open-above', example, [1])).toEqual([[2]])
    expect(found('s1-cadence-above', example, [4])).toEqual([])
    expect(found('s1-cadence-above', { ...example, line: 'A4 A4 B4 A4 D5' }, [4])).toEqual([[3]])
  })

  test('ask for no formula where the reduction leaves the cantus without a step to its final', () => {
    const example = { cantus: 'D4 F4 A4 E4 D4', line: 'A4 A4 C5 C#5 D5' }
    expect(found('s1-cadence-above', example, [4])).toEqual([])
    expect(found('s1-cadence-motion', example, [4])).toEqual([])
  })
})
