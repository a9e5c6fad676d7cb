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
import { readMoments, readVoice } from '@/shared/rules/reading'
import type { AnyRule, Species } from '@/shared/rules/rule'

export type More = Partial<Pick<Example, 'mode' | 'final' | 'position' | 'params' | 'cantus'>>
/** What a line shows of a rule: the line, the last bar of each finding in order (none: accepted), what it shows. */
export type Row = readonly [line: string, bars: readonly number[], shows: string, more?: More]

type Table = Readonly<{
  species: Species
  rules: readonly AnyRule[]
  cantus: string
  cases: Readonly<Record<string, readonly Row[]>>
  /** Bars with which the bars before a cut are replaced, to see whether equal keys mean equal futures. */
  otherBars: readonly string[]
}>

/** Holds every rule of a species against its table of accepted and rejected lines. */
export function testRuleCases({ species, rules, cantus, cases, otherBars }: Table): void {
  const exampleOf = ([line, breaches, , more]: Row): Example => ({
    cantus,
    line,
    species,
    mode: 'dorian',
    final: 'D',
    ...more,
    breaches,
  })
  const judge = (rule: AnyRule, row: Row): readonly Breach[] => judgeExample(rule, exampleOf(row))

  test('every rule has its accepted and its rejected cases', () => {
    for (const { id } of rules) {
      const rows = cases[id] ?? []
      const accepted = rows.filter(([, bars]) => bars.length === 0).length
      expect([id, accepted >= 2, rows.length - accepted >= 2]).toEqual([id, true, true])
    }
    expect(Object.keys(cases).sort()).toEqual(rules.map(({ id }) => id).sort())
  })

  describe.each(rules.map((rule) => [rule.id, rule] as const))('%s', (id, rule) => {
    const rows = cases[id] ?? []

    test.each(rows.map((row) => [row[1].length === 0 ? 'accepts' : 'rejects', row[2], row] as const))(
      '%s: %s',
      (_verdict, _shows, row) => {
        expect(judge(rule, row).map(({ bars }) => bars.at(-1))).toEqual(row[1])
      },
    )

    test('shows a right example that a teacher could stand by', () => {
      const { exercise, line } = readExample(rule.explain.right)
      const broken = checkLine(exercise, line, findPreset('fux-mann') as RuleSet).filter(
        ({ level }) => level === 'law',
      )
      expect(broken).toEqual([])
    })

    test('points at bars and notes that are written, and puts every finding in words', () => {
      for (const row of rows) {
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
      const said = new Set(rows.flatMap((row) => judge(rule, row).map(({ code }) => code)))
      const sayable = Object.keys(rule.explain.messages).filter((code) => !code.endsWith('.mend'))
      expect(sayable.filter((code) => !said.has(code))).toEqual([])
    })

    test('gives equal keys only to states that say the same of whatever follows', () => {
      for (const row of rows) expectKeysToHold(rule, exampleOf(row), otherBars)
    })
  })
}

/** Folds pairs of beginnings of one length; where their keys agree, the rest of the line must be judged alike. */
function expectKeysToHold(rule: AnyRule, example: Example, otherBars: readonly string[]): void {
  const written = (example.line as string).split(' ')
  for (let cut = 1; cut < written.length; cut += 1) {
    const byKey = new Map<string, string>()
    for (const line of variantsOf(written, cut, otherBars)) {
      const { key, said } = foldOver(rule, { ...example, line }, cut)
      const known = byKey.get(key)
      const rest = JSON.stringify(said)
      if (known === undefined) byKey.set(key, rest)
      else
        expect(`${rule.id} ${example.cantus} | ${line} | ${cut} ${rest}`).toBe(
          `${rule.id} ${example.cantus} | ${line} | ${cut} ${known}`,
        )
    }
  }
}

/** The line with other bars before the cut; what comes after stays. */
function variantsOf(
  written: readonly string[],
  cut: number,
  otherBars: readonly string[],
): readonly string[] {
  const variants = [written.join(' ')]
  for (const last of otherBars) {
    for (const before of cut > 1 ? otherBars : ['']) {
      const variant = [...written]
      variant[cut - 1] = last
      if (cut > 1) variant[cut - 2] = before
      variants.push(variant.join(' '))
    }
  }
  return variants
}

/** The key after the bars up to the cut, with what the next moment is, and all that is said from there on. */
function foldOver(rule: AnyRule, example: Example, cut: number) {
  const { exercise, line, barCount } = readExample(example)
  const params: unknown = rule.params.parse(example.params ?? {})
  const moments = rule.scope === 'pair' ? readMoments(exercise, line) : readVoice(barCount, line)
  const said: string[] = []
  let state: unknown = rule.start(exercise, params, 'line')
  let key = ''
  let future = ''
  for (const moment of moments) {
    // The moments that follow a cut depend on the bar before it by what is tied over, and by their place in the reading.
    if (moment.bar > cut && key === '') key = String(rule.key(state))
    if (moment.bar > cut) future += ` ${moment.bar}.${moment.place}${moment.isStruck ? '' : '~'}`
    const next = rule.step(state, moment, params)
    state = next.state
    if (next.breach && moment.bar > cut) said.push(`${moment.bar}.${moment.place} ${next.breach.code}`)
  }
  const last = rule.finish(state, params, true)
  if (last) said.push(`end ${last.code}`)
  return { key: `${key}${future}`, said }
}
