import { existsSync } from 'node:fs'
import { join } from 'node:path'
import { judgeExample, readExample } from '@/shared/rules/example'
import { FIFTH_SPECIES_RULES } from '@/shared/rules/fifth-species'
import { FIRST_SPECIES_RULES } from '@/shared/rules/first-species'
import { FOURTH_SPECIES_RULES } from '@/shared/rules/fourth-species'
import { MELODY_RULES } from '@/shared/rules/melody'
import { RULES } from '@/shared/rules/registry'
import type { AnyRule } from '@/shared/rules/rule'
import { SECOND_SPECIES_RULES } from '@/shared/rules/second-species'
import { THIRD_SPECIES_RULES } from '@/shared/rules/third-species'
import { ruleSetProblems } from '@/shared/rules/rule-set'
import { findSource } from '@/shared/rules/sources'
import { THREE_VOICE_RULES } from '@/shared/rules/three-voices'
import { CATALOGUE } from './catalogue'

/** Folders of rules, with the part of the catalogue that each holds. */
const FOLDERS: readonly (readonly [folder: string, rules: readonly AnyRule[], species: number])[] = [
  ['melody', MELODY_RULES, 0],
  ['first-species', FIRST_SPECIES_RULES, 1],
  ['second-species', SECOND_SPECIES_RULES, 2],
  ['third-species', THIRD_SPECIES_RULES, 3],
  ['fourth-species', FOURTH_SPECIES_RULES, 4],
  ['fifth-species', FIFTH_SPECIES_RULES, 5],
  ['three-voices', THREE_VOICE_RULES, 6],
]
const folderOf = (rule: AnyRule): string =>
  FOLDERS.find(([, rules]) => rules.includes(rule))?.[0] ?? 'no folder'
const rows = RULES.map((rule) => [rule.id, rule] as const)

/** Freezes an object and all it holds, so that writing to it throws. */
function freezeDeeply<Value>(value: Value): Value {
  if (typeof value === 'object' && value !== null && !Object.isFrozen(value)) {
    Object.freeze(value)
    Object.values(value).forEach(freezeDeeply)
  }
  return value
}

describe('the registry', () => {
  test.each(FOLDERS)(
    'holds in %s just the rules of its part of the catalogue, in its order',
    (_folder, rules, species) => {
      expect(rules.map(({ id }) => id)).toEqual(
        CATALOGUE.filter((row) => row.species === species).map(({ id }) => id),
      )
    },
  )

  test('holds the whole catalogue, each rule once, in its order', () => {
    expect(RULES.map(({ id }) => id)).toEqual(CATALOGUE.map(({ id }) => id))
    expect(new Set(RULES.map(({ id }) => id)).size).toBe(RULES.length)
  })

  test('gives each rule the catalogue’s level', () => {
    const levels = Object.fromEntries(CATALOGUE.map(({ id, level }) => [id, level]))
    for (const { id, level } of RULES) expect([id, level]).toEqual([id, levels[id]])
  })
})

describe.each(rows)('%s', (_id, rule) => {
  const { explain } = rule

  test('stands in the file of its name', () => {
    expect(existsSync(join('shared/rules', folderOf(rule), `${rule.id}.ts`))).toBe(true)
  })

  test('explains itself in sentences and cites works that are known', () => {
    for (const text of [explain.statement, explain.why, explain.mends]) expect(text).toMatch(/^[A-Z].*[.]$/s)
    expect(explain.title).toMatch(/^[A-Z].*[^.]$/)
    expect(explain.sources.length).toBeGreaterThan(0)
    for (const { source } of explain.sources)
      expect([source, findSource(source) !== null]).toEqual([source, true])
    expect(Object.keys(explain.messages).length).toBeGreaterThan(0)
  })

  test('judges its own examples as they claim', () => {
    for (const example of [explain.right, explain.wrong]) {
      const bars = judgeExample(rule, example).map((breach) => breach.bars.at(-1))
      expect([example.cantus, example.line, bars]).toEqual([example.cantus, example.line, example.breaches])
    }
    expect(explain.right.breaches).toEqual([])
    expect(explain.wrong.breaches.length).toBeGreaterThan(0)
  })

  test('has a sentence for what it says, with a value for every placeholder', () => {
    for (const breach of judgeExample(rule, explain.wrong)) {
      const sentence = explain.messages[breach.code]
      expect(sentence).toBeDefined()
      for (const [, name] of (sentence as string).matchAll(/\{(\w+)\}/g)) {
        expect(Object.keys(breach.args)).toContain(name)
      }
    }
  })

  test('points at bars that exist, in ascending order, and at notes in them', () => {
    const { barCount } = readExample(explain.wrong)
    for (const { bars, notes } of judgeExample(rule, explain.wrong)) {
      expect(bars.length).toBeGreaterThan(0)
      expect([...bars].sort((a, b) => a - b)).toEqual(bars)
      expect(new Set(bars).size).toBe(bars.length)
      expect(Math.min(...bars)).toBeGreaterThanOrEqual(1)
      expect(Math.max(...bars)).toBeLessThanOrEqual(barCount)
      for (const { bar } of notes) expect(bars).toContain(bar)
    }
  })

  test('has a default for every parameter and refuses what it does not know', () => {
    const defaults: unknown = rule.params.parse({})
    expect(rule.params.parse(defaults)).toEqual(defaults)
    expect(rule.params.safeParse({ 'no-such-parameter': 1 }).success).toBe(false)
    for (const name of Object.keys(defaults as object)) {
      expect([name, rule.params.safeParse({ [name]: { wrong: true } }).success]).toEqual([name, false])
      expect(
        ruleSetProblems({
          id: 'x',
          name: 'X',
          rules: { [rule.id]: { level: 'law', params: { [name]: { wrong: true } } } },
        }),
      ).toMatchObject([{ ruleId: rule.id, code: 'bad-params', path: name }])
    }
  })

  test('is deterministic and leaves its input untouched', () => {
    const example = freezeDeeply(explain.wrong)
    expect(judgeExample(rule, example)).toEqual(judgeExample(rule, example))
  })
})
