import { findConflicts } from '@/shared/rule-sets/find-conflicts'
import { createCore1, PRESETS, type RuleSet } from '@/shared/rules'

const setOf = (rules: RuleSet['rules']): RuleSet => ({ id: 'tried', name: 'Tried', rules })
const kindsOf = (rules: RuleSet['rules']) => findConflicts(setOf(rules)).map(({ kind }) => kind)

describe('what a rule set asks for that cannot be had together', () => {
  it.each(PRESETS.map((preset) => [preset.id, preset] as const))('is nothing in %s', (_id, preset) => {
    expect(findConflicts(preset)).toEqual([])
  })

  it('is nothing where there are no rules', () => {
    expect(findConflicts(setOf({}))).toEqual([])
  })

  it('is a least that is greater than its most', () => {
    const rules = { 'cf-length': { level: 'law', params: { least: 20, most: 10 } } } as const
    expect(findConflicts(setOf(rules))).toEqual([
      { kind: 'crossed-bounds', ruleId: 'cf-length', low: 'least', high: 'most' },
    ])
    expect(kindsOf({ 'cf-length': { ...rules['cf-length'], level: 'off' } })).toEqual([])
  })

  it('is a compass whose lowest note is above its highest, compared by pitch and not by name', () => {
    const compass = (aboveLow: string, aboveHigh: string) => ({
      'voice-compass': { level: 'preference' as const, params: { aboveLow, aboveHigh } },
    })
    expect(kindsOf(compass('A4', 'C4'))).toEqual(['crossed-bounds'])
    expect(kindsOf(compass('B3', 'C5'))).toEqual([])
  })

  it('is an opening that allows nothing, where it is law', () => {
    const params = { set: [], secondBest: [] }
    const open = (level: 'law' | 'preference') => ({ 's1-open-above': { level, params } })
    expect(kindsOf(open('law'))).toContain('nothing-allowed')
    expect(kindsOf(open('preference'))).toEqual([])
  })

  it('is two laws that refuse each other, told with the bar where every line stops', () => {
    const conflicts = findConflicts(
      setOf({
        's1-open-above': { level: 'law', params: { set: ['octave'] } },
        'dist-max': { level: 'law', params: { max: 3 } },
      }),
    )
    expect(conflicts).toHaveLength(1)
    expect(conflicts[0]).toMatchObject({ kind: 'no-line', position: 'above', bar: 1 })
    const { rules } = conflicts[0] as { rules: readonly string[] }
    expect([...rules].sort()).toEqual(['dist-max', 's1-open-above'])
  })

  it('is nothing in the core rules', () => {
    expect(findConflicts(createCore1({ lowest: 'D2', highest: 'D6' }))).toEqual([])
  })
})
