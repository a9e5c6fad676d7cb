import { checkLine, readExample, type RuleSet } from '@/shared/rules'
import { THIRD_SPECIES_RULES } from '@/shared/rules/third-species'
import { testRuleCases } from './rule-cases'
import { THIRD_CANTUS, THIRD_CASES } from './third-species-cases'

testRuleCases({
  species: 3,
  rules: THIRD_SPECIES_RULES,
  cantus: THIRD_CANTUS,
  cases: THIRD_CASES,
  otherBars: [
    'A4:1,B4:1,C5:1,A4:1',
    'D4:1,E4:1,F4:1,G4:1',
    'C5:1,B4:1,G4:1,A4:1',
    'F4:1,G4:1,E4:1,F4:1',
    'D5:1,C5:1,B4:1,C5:1',
    'r:1,A4:1,G4:1,F4:1',
    '.',
  ],
})

test('a scale between tritones is told by one rule, and by the general one only in other species', () => {
  const ruleSet: RuleSet = {
    id: 'x',
    name: 'X',
    rules: { 'mel-tritone-outline': { level: 'law' }, 's3-scale-tritone': { level: 'law' } },
  }
  const told = (species: 3 | 5) => {
    const { exercise, line } = readExample({
      cantus: THIRD_CANTUS,
      line: 'A4:1,G4:1,F4:1,G4:1 A4:1,B4:1,A4:1,F4:1 G4:1,A4:1,B4:1,C#5:1 D5',
      mode: 'dorian',
      final: 'D',
      species,
      breaches: [],
    })
    return checkLine(exercise, line, ruleSet).map(({ ruleId }) => ruleId)
  }
  expect(told(3)).toEqual(['s3-scale-tritone'])
  expect(told(5)).toContain('mel-tritone-outline')
})
