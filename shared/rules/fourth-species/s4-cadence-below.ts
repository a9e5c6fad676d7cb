import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { judgeTiedCadence, tiedCadence, type CadenceState } from '@/shared/rules/fourth-species/cadence'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4CadenceBelow: Rule<CadenceState, NoParams> = {
  id: 's4-cadence-below',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: NO_PARAMS,
  ...tiedCadence((held, now, exercise) =>
    exercise.position === 'below' ? judgeTiedCadence(held, now, exercise) : null,
  ),
  explain: {
    title: 'Close with 2–3, below',
    statement:
      'Under a cantus that falls 2–1 the last bar but one holds a second, which falls to a minor third and closes to the unison.',
    why: 'It is the close of first species with its leading tone delayed, so that the pull to the final is felt twice.',
    mends: 'Hold the final over into the last bar but one, and fall to the leading tone.',
    sources: cite('OMT1', 'DAVID', 'NOTAV', 'EX'),
    disagreement: 'One course adds that the line should not come to this close from a fourth.',
    right: example('r:2,D3:2~ D3:2,D4:2~ D4:2,C#4:2 D4', [], { position: 'below' }),
    wrong: example('r:2,D4:2~ D4:2,A3:2~ A3:2,C#4:2 D4', [3], { position: 'below' }),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a minor third that closes to the unison.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the third must be minor.',
      'no-suspension': 'The last bar but one does not hold a second under the cantus before its third.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'Write the second degree, so that the line falls by step to the final.',
    },
  },
}
