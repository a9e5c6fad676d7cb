import { cite } from '@/shared/rules/cite'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, sizeOf } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'

export const vertFourth: Rule<Exercise, NoParams> = {
  id: 'vert-fourth',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) =>
    now.simpleSteps === 3 && now.simpleSemitones === 5
      ? breachAt('fourth', [now], { interval: sizeOf(now) })
      : null,
  ),
  explain: {
    title: 'The fourth is a dissonance',
    statement:
      'Between two voices a perfect fourth, and a fourth with octaves added, counts as a dissonance.',
    why: 'Over the lowest voice a fourth asks to fall to a third. It rests only where a third voice stands under it.',
    mends: 'Move the line by a step, to the third or the fifth beside it.',
    sources: cite('OMT1', 'GENN', 'LOEFF', 'NOTAV', 'RUSH I'),
    right: { cantus: 'D4 E4 F4 E4 D4', line: 'A4 G4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 F4 E4 D4', line: 'A4 A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { fourth: 'The voices sound a {interval}; between two voices a fourth is a dissonance.' },
  },
}
