import { cite } from '@/shared/rules/cite'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, nameOf } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'

export const vertDimFifth: Rule<Exercise, NoParams> = {
  id: 'vert-dim-fifth',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) =>
    (now.simpleSteps === 3 || now.simpleSteps === 4) && now.simpleSemitones === 6
      ? breachAt('tritone', [now], { interval: nameOf(now) })
      : null,
  ),
  explain: {
    title: 'No tritone between the voices',
    statement:
      'A diminished fifth and an augmented fourth between the voices count as dissonances, with octaves added as well.',
    why: 'Not every fifth is perfect: over B stands F, a semitone short. The ear hears the tritone and waits for it to resolve.',
    mends: 'Take the third or the sixth over that cantus note instead.',
    sources: cite('GENN', 'LEHM I', 'NOTAV', 'TALK (citing Mann)'),
    right: {
      cantus: 'C4 D4 B3 E4 D4 C4',
      line: 'G4 F4 G4 C5 B4 C5',
      mode: 'ionian',
      final: 'C',
      breaches: [],
    },
    wrong: {
      cantus: 'C4 D4 B3 E4 D4 C4',
      line: 'G4 F4 F4 G4 B4 C5',
      mode: 'ionian',
      final: 'C',
      breaches: [3],
    },
    messages: { tritone: 'The voices sound a {interval}, the tritone.' },
  },
}
