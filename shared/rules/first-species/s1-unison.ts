import { cite } from '@/shared/rules/cite'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isUnison } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'

export const s1Unison: Rule<Exercise, NoParams> = {
  id: 's1-unison',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now, { moment }) =>
    isUnison(now) && !moment.isFirst && !moment.isLast ? breachAt('inside', [now]) : null,
  ),
  explain: {
    title: 'Unisons only at the ends',
    statement: 'The voices meet in a unison only in the first and the last bar.',
    why: 'In a unison one of the two voices is gone.',
    mends: 'Take the third instead.',
    sources: cite('OMT1', 'RUSH I', 'LEHM I', 'NOTAV', 'CHER r2', 'FLASH', 'HSR'),
    right: { cantus: 'D4 G4 F4 E4 D4', line: 'A4 B4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 G4 F4 E4 D4', line: 'A4 G4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { inside: 'The voices meet in a unison inside the exercise.' },
  },
}
