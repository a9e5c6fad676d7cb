import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, nameOf } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { figureOf, shapeOfUpbeat } from '@/shared/rules/second-species/dissonant-upbeat'
import { passingExample, PASSING_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES, weakNotes, type WeakState } from '@/shared/rules/second-species/folds'

/**
 * A step back is the matter of `s2-neighbour`, a falling third that of `s2-cambiata`; a dissonance on the next downbeat
 * that of `s2-downbeat-consonant`.
 */
export const s2UpbeatPassing: Rule<WeakState, NoParams> = {
  id: 's2-upbeat-passing',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...weakNotes<NoParams>(isDissonance, (from, at, to) => {
    const shape = shapeOfUpbeat(from, at, to)
    return shape === 'leapt-into' || shape === 'leapt-from'
      ? breachAt(shape, figureOf(from, at, to), { interval: nameOf(at) })
      : null
  }),
  explain: {
    title: 'A dissonance only in passing',
    statement:
      'A dissonance in the second half of a bar is a passing note: reached by step and left by step in the same direction, from one consonance to another.',
    why: 'Stepping through a dissonance the line never rests on it. A leap to or from it would bring it out.',
    mends: 'Fill the third between two consonances by step, or take a consonance instead.',
    sources: cite('OMT1', 'FUXE', 'GROVE', 'CHER r10', 'FLASH', 'EX'),
    right: passingExample(PASSING_LINE),
    wrong: passingExample('r:2,A4:2 C5:2,A4:2 B4:2,G4:2 B4:2,C#5:2 D5', [2]),
    messages: {
      'leapt-into':
        'The {interval} in the second half of the bar is a dissonance and is not reached by step.',
      'leapt-from': 'The {interval} in the second half of the bar is a dissonance and is not left by step.',
    },
  },
}
