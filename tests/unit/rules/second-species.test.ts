import { SECOND_SPECIES_RULES } from '@/shared/rules/second-species'
import { testRuleCases } from './rule-cases'
import { SECOND_CANTUS, SECOND_CASES } from './second-species-cases'

testRuleCases({
  species: 2,
  rules: SECOND_SPECIES_RULES,
  cantus: SECOND_CANTUS,
  cases: SECOND_CASES,
  otherBars: ['D5:2,A4:2', 'C5:2,B4:2', 'A4:2,G4:2', 'F4:2,A4:2', 'r:2,A4:2', 'D5', '.'],
})
