import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import {
  cadence,
  CADENCE_PARAMS,
  type CadenceParams,
  type CadenceState,
} from '@/shared/rules/second-species/cadence'
import { shortExample } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

export const s2CadenceBelow: Rule<CadenceState, CadenceParams> = {
  id: 's2-cadence-below',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: CADENCE_PARAMS,
  ...cadence('below'),
  explain: {
    title: 'The close below: 5–3–1',
    statement:
      'Under a cantus that falls 2–1 the last bar but one goes from a fifth to a minor third, which closes to the unison; in Phrygian, where the fifth is not perfect, from a minor sixth. Tenths and twelfths stand for thirds and fifths. Under a cantus that rises 7–1 the line takes 2–1 itself.',
    why: 'It is the close of first species, with the fifth leaping up to the leading tone before it.',
    mends:
      'Write the fifth under the cantus in the first half and the leading tone, a minor third, in the second.',
    sources: cite('FUXE', 'FUXN', 'DAVD', 'EX Fig 37'),
    disagreement: 'The open textbook prescribes only the last two notes.',
    right: shortExample('r:2,D4:2 A3:2,F3:2 A3:2,C#4:2 D4', [], { position: 'below' }),
    wrong: shortExample('r:2,D4:2 A3:2,F3:2 G3:2,C#4:2 D4', [3], { position: 'below' }),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a minor third or tenth that closes to the final.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the third or tenth must be minor.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'End the bar on the second degree, so that the line falls by step to the final.',
      'no-fifth': 'The last bar but one begins with a {interval}, not with a fifth.',
      'no-fifth.mend': 'Write the fifth under the cantus in the first half of the bar.',
      'no-sixth':
        'The last bar but one begins with a {interval}, not with the minor sixth of the Phrygian close.',
      'no-sixth.mend': 'Write the minor sixth under the cantus in the first half of the bar.',
      dissonant: 'Before the close the voices sound a {interval}, a dissonance.',
    },
  },
}
