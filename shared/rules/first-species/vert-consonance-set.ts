import { cite } from '@/shared/rules/cite'
import { eachSonority, FIRST_SPECIES, NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, nameOf } from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { isConsonant } from '@/shared/theory/interval'

/**
 * Judges all dissonances but two: the perfect fourth is the matter of `vert-fourth`, the tritone of `vert-dim-fifth`,
 * so that one fault is told once.
 */
export const vertConsonanceSet: Rule<Exercise, NoParams> = {
  id: 'vert-consonance-set',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: NO_PARAMS,
  ...eachSonority((now) => {
    if (isConsonant(now)) return null
    const { simpleSteps, simpleSemitones } = now
    const isFourth = simpleSteps === 3 && simpleSemitones === 5
    const isTritone = (simpleSteps === 3 || simpleSteps === 4) && simpleSemitones === 6
    return isFourth || isTritone ? null : breachAt('dissonant', [now], { interval: nameOf(now) })
  }),
  explain: {
    title: 'Consonances only',
    statement:
      'Against the cantus the line sounds only unisons, thirds, fifths, sixths, octaves and these with octaves added, perfect, major or minor.',
    why: 'A dissonance pulls towards what comes after it. With one note against one there is no weak place on which it could pass.',
    mends: 'Move the note by a step: the nearest third, fifth, sixth or octave will do.',
    sources: cite('FUXE', 'OMT1', 'LEHM I', 'NOTAV I-i', 'LOEFF r1', 'RWU', 'HSR'),
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'D5 E5 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: { dissonant: 'The voices sound a {interval}, a dissonance.' },
  },
}
