import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, lineSpan, nameOf } from '@/shared/rules/first-species/sonority'
import { afterSome, isSuspension, type AfterState } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5OrnamentLeap: Rule<AfterState, NoParams> = {
  id: 's5-ornament-leap',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: NO_PARAMS,
  ...afterSome<NoParams>(isSuspension, (before, now) =>
    now.isStruck && lineSpan(before, now) > 1 && isDissonance(now)
      ? breachAt('dissonant', [before, now], { interval: nameOf(now) })
      : null,
  ),
  explain: {
    title: 'Leap from a suspension to a consonance',
    statement: 'A note that the line leaps to from a suspension agrees with the cantus.',
    why: 'One dissonance is already waiting. A leap to a second one leaves the ear with nothing to hold on to.',
    mends: 'Leap to a third, fifth, sixth or octave with the cantus; a fifth down is the usual leap.',
    sources: cite('LEHM IX', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:2~ D5:1,A4:1,C#5:2 D5', [3]),
    messages: { dissonant: 'From the suspension the line leaps to a {interval}, which is dissonant.' },
  },
}
