import { FIFTH_SPECIES_RULES } from '@/shared/rules/fifth-species'
import { FIFTH_CANTUS, FIFTH_CASES } from './fifth-species-cases'
import { testRuleCases } from './rule-cases'

testRuleCases({
  species: 5,
  rules: FIFTH_SPECIES_RULES,
  cantus: FIFTH_CANTUS,
  cases: FIFTH_CASES,
  otherBars: [
    'D5:2,A4:2~',
    'A4:1,B4:1,C5:1,D5:1',
    'E5:2~,E5:1,D5:1~',
    'F4:1,E4:0.5,D4:0.5,E4:2~',
    'A4:1,G4:1,A4:2',
    'D5:1,C5:3',
    'D5',
    '.',
  ],
})
