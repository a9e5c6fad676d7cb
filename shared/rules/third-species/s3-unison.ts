import { cite } from '@/shared/rules/cite'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isUnison } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

export const s3Unison: Rule<Exercise, NoParams> = {
  id: 's3-unison',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { moment }) =>
    isUnison(now) && now.place === 0 && !moment.isFirst && !moment.isLast ? breachAt('inside', [now]) : null,
  ),
  explain: {
    title: 'No unison on the downbeat',
    statement: 'Inside the exercise the voices meet in a unison on any quarter but the first.',
    why: 'In a unison one of the two voices is gone. On the downbeat it is missed; elsewhere it is passed over.',
    mends: 'Take the third instead, or move the unison to a later quarter.',
    sources: cite('OMT1', 'LEHM IV', 'NOTAV III-iii', 'DAVID', 'EX'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 F4:1,G4:1,A4:1,Bb4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: { inside: 'The voices meet in a unison on the downbeat.' },
  },
}
