import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import { moves, THIRD_SPECIES, type Moves } from '@/shared/rules/third-species/folds'

/** A third out of a dissonance may be a figure, and is the matter of `s3-cambiata` and `s3-double-neighbour`. */
export const s3DissonanceStep: Rule<Moves, NoParams> = {
  id: 's3-dissonance-step',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: NO_PARAMS,
  ...moves<NoParams>((state, now) => {
    const figure = figureAt(state, now)
    if (figure === 'leapt-into') {
      return state.before === null
        ? breachAt('after-rest', [now], { interval: nameOf(now) })
        : breachAt('leapt-into', [state.before, now], { interval: nameOf(now) })
    }
    if (figure !== 'leapt-from') return null
    return breachAt('leapt-from', notesOf(state, now), { interval: nameOf(state.before as Sonority) })
  }),
  explain: {
    title: 'Into and out of a dissonance by step',
    statement: 'A dissonance is entered by step and left by step, apart from the figures that have names.',
    why: 'A step carries the ear over the dissonance. A leap stops at it and makes a point of it.',
    mends: 'Fill the leap with a step, or take a consonance for this note.',
    sources: cite('OMT1', 'SEQ', 'LEHM', 'FLASH', 'EX'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,F4:1,Bb4:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: {
      'leapt-into': 'The line leaps into a {interval}, a dissonance.',
      'leapt-from': 'The line leaps out of a {interval}, a dissonance.',
      'after-rest': 'After the rest the line enters on a {interval}, a dissonance.',
    },
  },
}
