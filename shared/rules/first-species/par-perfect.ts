import { cite } from '@/shared/rules/cite'
import {
  BARE_SPECIES,
  neighbours,
  NO_PARAMS,
  type NeighbourState,
  type NoParams,
} from '@/shared/rules/first-species/folds'
import { judgeParallel } from '@/shared/rules/first-species/perfect-entry'
import type { Rule } from '@/shared/rules/rule'

export const parPerfect: Rule<NeighbourState, NoParams> = {
  id: 'par-perfect',
  level: 'law',
  scope: 'pair',
  species: BARE_SPECIES,
  params: NO_PARAMS,
  ...neighbours(judgeParallel),
  explain: {
    title: 'No parallel fifths or octaves',
    statement:
      'Two fifths, or two octaves or unisons, do not follow each other while both voices move the same way. Twelfths count as fifths.',
    why: 'In a row of equal perfect consonances the second voice only doubles the first, and there is one line where there should be two.',
    mends: 'Come to the second one from a third or a sixth, or let the line move the other way.',
    sources: cite('FUXE r1', 'RWU', 'OMT1', 'CHER r4', 'LEHM', 'NOTAV', 'RUSH'),
    right: { cantus: 'D4 F4 G4 E4 D4', line: 'A4 A4 B4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 G4 E4 D4', line: 'A4 C5 B4 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: {
      fifths: 'Two fifths follow each other, both voices moving the same way.',
      octaves: 'Two octaves follow each other, both voices moving the same way.',
      unisons: 'Two unisons follow each other, both voices moving the same way.',
    },
  },
}
