import { checkLine, findPreset, readExample, type RuleSet } from '@/shared/rules'
import { FOURTH_SPECIES_RULES } from '@/shared/rules/fourth-species'
import { FOURTH_CANTUS, FOURTH_CASES } from './fourth-species-cases'
import { testRuleCases } from './rule-cases'

testRuleCases({
  species: 4,
  rules: FOURTH_SPECIES_RULES,
  cantus: FOURTH_CANTUS,
  cases: FOURTH_CASES,
  otherBars: ['D5:2,A4:2~', 'A4:2,A4:2', 'E5:2,D5:2~', 'F4:2,C5:2~', 'D5:2,F4:2', 'D5', '.'],
})

describe('the outline of a line', () => {
  const rules = {
    'mel-single-climax': { level: 'law' },
    's4-shape-relaxed': { level: 'preference' },
  } as const
  const judge = (ruleSet: RuleSet, species: 2 | 4) => {
    const { exercise, line } = readExample({
      cantus: 'D4 F4 E4 D4',
      line: 'r:2,D5:2~ D5:2,D5:2~ D5:2,C#5:2 D5',
      mode: 'dorian',
      final: 'D',
      species,
      breaches: [],
    })
    return checkLine(exercise, line, ruleSet).map(({ ruleId }) => ruleId)
  }

  test('is not judged in fourth species while the licence is on', () => {
    expect(judge({ id: 'x', name: 'X', rules }, 4)).toEqual([])
  })

  test('is judged where the licence is off, and in the other species', () => {
    const off = { ...rules, 's4-shape-relaxed': { level: 'off' } } as const
    expect(judge({ id: 'x', name: 'X', rules: off }, 4)).toEqual(['mel-single-climax'])
    expect(judge({ id: 'x', name: 'X', rules }, 2)).toEqual(['mel-single-climax'])
  })

  test('is free in every preset', () => {
    for (const id of ['fux-mann', 'open-undergrad']) {
      expect(judge(findPreset(id) as RuleSet, 4)).not.toContain('mel-single-climax')
    }
  })
})
