import { cite } from '@/shared/rules/cite'
import { eachSonority, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, nameOf } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

/** A unison there is the matter of `s3-unison`. */
export const s3FirstConsonant: Rule<Exercise, NoParams> = {
  id: 's3-first-consonant',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) =>
    now.place === 0 && isDissonance(now) ? breachAt('dissonant', [now], { interval: nameOf(now) }) : null,
  ),
  explain: {
    title: 'The first quarter is consonant',
    statement: 'The first quarter of every bar is a consonance.',
    why: 'The first quarter falls together with the cantus and carries the harmony; a dissonance there is a clash.',
    mends: 'Move the note by a step, and let the dissonance pass on a later quarter.',
    sources: cite('OMT1', 'NOTAV III', 'RUSH III', 'MT21C', 'DAVID', 'EX'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,A4:1 G4:1,A4:1,G4:1,F4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: { dissonant: 'The bar begins with a {interval}, a dissonance.' },
  },
}
