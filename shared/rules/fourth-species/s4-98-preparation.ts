import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isUnison, perfectKindOf } from '@/shared/rules/first-species/sonority'
import {
  afterSome,
  isAboveCantus,
  isSuspension,
  TIED_SPECIES,
  type AfterState,
} from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s498Preparation: Rule<AfterState, NoParams> = {
  id: 's4-98-preparation',
  level: 'law',
  scope: 'pair',
  species: TIED_SPECIES,
  params: NO_PARAMS,
  ...afterSome<NoParams>(
    (now) => perfectKindOf(now) === 'octave',
    (before, now) => {
      if (!isSuspension(now) || !isAboveCantus(now) || now.simpleSteps !== 1) return null
      return breachAt(isUnison(before) ? 'from-unison' : 'from-octave', [before, now])
    },
  ),
  explain: {
    title: 'No 9–8 out of an octave',
    statement:
      'A ninth that falls to the octave is not held over from an octave, nor a second from a unison.',
    why: 'From octave to octave, with a ninth between, the voices move in parallel octaves; the tie only delays the second one.',
    mends: 'Prepare the ninth from a third, a fifth or a sixth.',
    sources: cite('NOTAV IV-i', 'TALK', 'FUX°'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,F5:2~ F5:2,E5:2 D5', [3]),
    messages: {
      'from-octave': 'The ninth is held over from an octave.',
      'from-unison': 'The second is held over from a unison.',
    },
  },
}
