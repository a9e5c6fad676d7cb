import { cite } from '@/shared/rules/cite'
import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'

export const s1CadenceBelow: Rule<Exercise, NoParams> = {
  id: 's1-cadence-below',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { exercise, moment }) =>
    moment.isPenultimate && exercise.position === 'below' ? judgePenultimate(now, exercise) : null,
  ),
  explain: {
    title: 'The last bar but one, below',
    statement:
      'Under a cantus that falls 2–1 the last bar but one is a minor third, which closes to the unison, or a minor tenth, which closes to the octave. Under a cantus that rises 7–1 the line takes 2–1 itself.',
    why: 'One voice falls a step to the final while the other rises to it from the leading tone. This close has ended music for centuries.',
    mends: 'Write the leading tone, a minor third under the cantus.',
    sources: cite('FUXE c', 'OMT1', 'NOTAV', 'EX'),
    right: {
      cantus: 'D4 F4 E4 D4',
      line: 'D4 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 E4 D4',
      line: 'D4 D4 G3 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a minor third or tenth that closes to the final.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the third or tenth must be minor.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'Write the second degree, so that the line falls by step to the final.',
    },
  },
}
