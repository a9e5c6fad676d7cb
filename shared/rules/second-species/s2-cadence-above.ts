import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import {
  cadence,
  CADENCE_PARAMS,
  type CadenceParams,
  type CadenceState,
} from '@/shared/rules/second-species/cadence'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

export const s2CadenceAbove: Rule<CadenceState, CadenceParams> = {
  id: 's2-cadence-above',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: CADENCE_PARAMS,
  ...cadence('above'),
  explain: {
    title: 'The close above: 5–6–8',
    statement:
      'Over a cantus that falls 2–1 the last bar but one goes from a fifth to a major sixth, which opens to the octave. It may also hold the sixth as a whole note. Over a cantus that rises 7–1 the line takes 2–1 itself.',
    why: 'It is the close of first species, with the fifth stepping up to the leading tone before it.',
    mends: 'Write the fifth in the first half and the leading tone, a major sixth, in the second.',
    sources: cite('FUXE', 'FUXN', 'DAVD', 'OMT1', 'EX'),
    disagreement: 'The open textbook prescribes only the last two notes.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,F4:2 G4:2,C#5:2 D5', [3]),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a major sixth that opens to the octave.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the sixth must be major.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'End the bar on the second degree, so that the line falls by step to the final.',
      'no-fifth': 'The last bar but one begins with a {interval}, not with a fifth.',
      'no-fifth.mend': 'Write the fifth over the cantus in the first half of the bar.',
      dissonant: 'Before the close the voices sound a {interval}, a dissonance.',
    },
  },
}
