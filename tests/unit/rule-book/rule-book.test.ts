import { playbackOfExample, scoreOfExample } from '@/components/rules/score-of-example'
import { bySection, searchPages, sectionOf } from '@/components/rules/sections'
import { layoutScore } from '@/shared/notation/layout-score'
import { judgeExample, readExample, RULES } from '@/shared/rules'
import { RULE_BOOK } from '@/shared/rules/rule-book'
import { findSource } from '@/shared/rules/sources'

const PAGES = Object.values(RULE_BOOK)

describe('the rule book', () => {
  it('has every rule in one section', () => {
    const placed = bySection(PAGES).flatMap(({ pages }) => pages.map(({ id }) => id))
    expect([...placed].sort()).toEqual(RULES.map(({ id }) => id).sort())
  })

  it('puts rules where a reader looks for them', () => {
    const all = [1, 2, 3, 4, 5] as const
    expect(sectionOf({ scope: 'cantus', species: all })).toBe('cantus')
    expect(sectionOf({ scope: 'melody', species: all })).toBe('melody')
    expect(sectionOf({ scope: 'pair', species: all })).toBe('every-species')
    expect(sectionOf({ scope: 'trio', species: [1] })).toBe('three-voices')
    expect(sectionOf({ scope: 'pair', species: [4] })).toBe(4)
    expect(sectionOf({ scope: 'pair', species: [2, 3] })).toBe('several-species')
  })

  it('finds rules by every word typed', () => {
    expect(searchPages('', PAGES)).toEqual(PAGES)
    const parallel = searchPages('parallel', PAGES)
    expect(parallel.length).toBeGreaterThan(0)
    expect(searchPages('parallel fifths', PAGES).length).toBeLessThanOrEqual(parallel.length)
    expect(searchPages('  PARALLEL ', PAGES)).toEqual(parallel)
    expect(searchPages('zzzz', PAGES)).toEqual([])
  })

  it.each(PAGES.map((page) => [page.id, page] as const))('names the works behind %s in full', (_id, page) => {
    expect(page.sources.map(({ source }) => findSource(source)?.work.length ?? 0).every((n) => n > 8)).toBe(
      true,
    )
  })

  it.each(RULES.map((rule) => [rule.id, rule] as const))(
    'draws and plays both examples of %s',
    (_id, rule) => {
      for (const which of ['right', 'wrong'] as const) {
        const written = rule.explain[which]
        const example = readExample(written)
        const breaches = judgeExample(rule, written)
        const input = scoreOfExample(example, breaches, 'law')
        expect(input.bars).toHaveLength(example.barCount)
        expect(input.bars.some(({ cantus, line }) => cantus !== null || line !== null)).toBe(true)
        expect(input.arcs.length > 0).toBe(breaches.length > 0)
        const layout = layoutScore(input, { widthPx: 360, size: 'page' })
        expect(layout.systems.length).toBeGreaterThan(0)
        const heard = playbackOfExample(example)
        expect(heard.cantus.length + Object.keys(heard.line).length).toBeGreaterThan(0)
      }
    },
  )

  it('inks nothing of a rule that is off', () => {
    const rule = RULES.find(({ id }) => id === 'par-perfect') as (typeof RULES)[number]
    const { wrong } = rule.explain
    const input = scoreOfExample(readExample(wrong), judgeExample(rule, wrong), 'off')
    expect(input.arcs).toEqual([])
    expect(input.bars.every(({ figure }) => figure === null || figure.tone === 'cantus')).toBe(true)
  })
})
