import { cite } from '@/shared/rules/cite'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isUnison } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { passingExample, PASSING_LINE, shortExample } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

export const s2Unison: Rule<Exercise, NoParams> = {
  id: 's2-unison',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { moment }) =>
    isUnison(now) && now.place === 0 && !moment.isFirst && !moment.isLast ? breachAt('inside', [now]) : null,
  ),
  explain: {
    title: 'Unisons only off the beat',
    statement: 'Inside the exercise the voices meet in a unison only in the second half of a bar.',
    why: 'In a unison one of the two voices is gone. On the beat it is missed; off the beat it is passed over.',
    mends: 'Take the third instead, or move the unison to the second half of the bar.',
    sources: cite('OMT1', 'LEHM II', 'GROVE', 'PERF', 'JEPP°', 'EX'),
    right: passingExample(PASSING_LINE),
    wrong: shortExample('r:2,A4:2 F4:2,A4:2 B4:2,C#5:2 D5', [2]),
    messages: { inside: 'The voices meet in a unison on the downbeat.' },
  },
}
