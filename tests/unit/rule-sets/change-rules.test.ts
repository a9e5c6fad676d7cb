import { changedRules, tidyRules, withRuleLevel, withRuleParam } from '@/components/rule-sets/change-rules'
import { fileNameOf } from '@/components/rule-sets/download-rule-set'
import { PRESETS } from '@/shared/rules'

const RULES = { 'par-perfect': { level: 'law' }, 'dist-max': { level: 'law', params: { max: 10 } } } as const

describe('changing a rule set', () => {
  it('is told, and is undone by changing back', () => {
    const off = withRuleLevel(RULES, 'par-perfect', 'off')
    expect(changedRules(off, RULES)).toEqual(['par-perfect'])
    expect(changedRules(withRuleLevel(off, 'par-perfect', 'law'), RULES)).toEqual([])
    const wider = withRuleParam(RULES, 'dist-max', 'max', 12)
    expect(wider['dist-max']).toEqual({ level: 'law', params: { max: 12 } })
    expect(changedRules(wider, RULES)).toEqual(['dist-max'])
    expect(RULES['dist-max'].params.max).toBe(10)
  })

  it('switches on what was left out, and keeps parameters while a rule is off', () => {
    const on = withRuleLevel(RULES, 'voice-cross', 'law')
    expect(changedRules(on, RULES)).toEqual(['voice-cross'])
    expect(withRuleLevel(RULES, 'dist-max', 'off')['dist-max']).toEqual({ level: 'off', params: { max: 10 } })
    expect(changedRules(withRuleLevel(RULES, 'voice-cross', 'off'), RULES)).toEqual([])
  })

  it('keeps no empty parameters', () => {
    expect(tidyRules({ 'par-perfect': { level: 'law', params: {} } })).toEqual({
      'par-perfect': { level: 'law' },
    })
    for (const { rules } of PRESETS) expect(tidyRules(rules)).toEqual(rules)
  })

  it.each([
    ['This term', 'this-term.rules.json'],
    ['Übung / Satz 1', 'ubung-satz-1.rules.json'],
    ['規則', 'rule-set.rules.json'],
  ])('%s is a file called %s', (name, file) => {
    expect(fileNameOf(name)).toBe(file)
  })
})
