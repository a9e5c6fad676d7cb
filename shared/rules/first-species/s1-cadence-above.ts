import { cite } from '@/shared/rules/cite'
import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'

export const s1CadenceAbove: Rule<Exercise, NoParams> = {
  id: 's1-cadence-above',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { exercise, moment }) =>
    moment.isPenultimate && exercise.position === 'above' ? judgePenultimate(now, exercise) : null,
  ),
  explain: {
    title: 'The last bar but one, above',
    statement:
      'Over a cantus that falls 2–1 the last bar but one is a major sixth, which opens to the octave. Over a cantus that rises 7–1 the line takes 2–1 itself.',
    why: 'One voice falls a step to the final while the other rises to it from the leading tone. This close has ended music for centuries.',
    mends: 'Write the leading tone, a major sixth over the cantus.',
    sources: cite('FUXE c', 'OMT1', 'NOTAV', 'FUX°', 'EX'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 B4 D5', mode: 'dorian', final: 'D', breaches: [3] },
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a major sixth that opens to the octave.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the sixth must be major.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'Write the second degree, so that the line falls by step to the final.',
    },
  },
}
