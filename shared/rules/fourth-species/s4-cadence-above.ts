import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { judgeTiedCadence, tiedCadence, type CadenceState } from '@/shared/rules/fourth-species/cadence'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4CadenceAbove: Rule<CadenceState, NoParams> = {
  id: 's4-cadence-above',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: NO_PARAMS,
  ...tiedCadence((held, now, exercise) =>
    exercise.position === 'above' ? judgeTiedCadence(held, now, exercise) : null,
  ),
  explain: {
    title: 'Close with 7–6, above',
    statement:
      'Over a cantus that falls 2–1 the last bar but one holds a seventh, which falls to a major sixth and opens to the octave.',
    why: 'It is the close of first species with its leading tone delayed, so that the pull to the final is felt twice.',
    mends: 'Hold the final over into the last bar but one, and fall to the leading tone.',
    sources: cite('OMT1', 'MT21C', 'DAVID', 'NOTAV', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,C5:2~ C5:2,C#5:2 D5', [3]),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a major sixth that opens to the octave.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the sixth must be major.',
      'no-suspension': 'The last bar but one does not hold a seventh over the cantus before its sixth.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'Write the second degree, so that the line falls by step to the final.',
    },
  },
}
