import { compareRuleSets, unknownRules } from '@/shared/rule-sets/compare-rule-sets'
import { PRESETS, RULES, type RuleSet } from '@/shared/rules'

const setOf = (rules: RuleSet['rules']): RuleSet => ({ id: 'tried', name: 'Tried', rules })

describe('two rule sets side by side', () => {
  it.each(PRESETS.map((preset) => [preset.id, preset] as const))('%s is like itself', (_id, preset) => {
    expect(compareRuleSets(preset, preset)).toEqual([])
  })

  it('differ in a level, left out being off', () => {
    const [difference, ...others] = compareRuleSets(setOf({ 'par-perfect': { level: 'law' } }), setOf({}))
    expect(others).toEqual([])
    expect(difference).toMatchObject({ ruleId: 'par-perfect', params: [] })
    expect(difference?.standings.map(({ level }) => level)).toEqual(['law', 'off'])
  })

  it('differ in the parameters that differ, defaults written or not', () => {
    const plain = setOf({ 'dist-max': { level: 'law' } })
    expect(compareRuleSets(plain, setOf({ 'dist-max': { level: 'law', params: { max: 12 } } }))).toEqual([])
    const wider = compareRuleSets(plain, setOf({ 'dist-max': { level: 'law', params: { max: 15 } } }))
    expect(wider.map(({ params }) => params)).toEqual([['max']])
    expect(wider[0]?.standings.map(({ params }) => params['max'])).toEqual([12, 15])
  })

  it('do not differ in what both have off', () => {
    const off = { level: 'off', params: { max: 15 } } as const
    expect(compareRuleSets(setOf({ 'dist-max': off }), setOf({}))).toEqual([])
  })

  it('are told in the order of the catalogue, whichever comes first', () => {
    for (const a of PRESETS) {
      for (const b of PRESETS) {
        const ids = compareRuleSets(a, b).map(({ ruleId }) => ruleId)
        expect(ids).toEqual(RULES.map(({ id }) => id).filter((id) => ids.includes(id)))
        expect(compareRuleSets(b, a).map(({ ruleId }) => ruleId)).toEqual(ids)
      }
    }
  })

  it('tell the rules that nobody knows', () => {
    expect(unknownRules(setOf({ 'par-perfect': { level: 'law' }, 'no-such': { level: 'law' } }))).toEqual([
      'no-such',
    ])
  })
})
