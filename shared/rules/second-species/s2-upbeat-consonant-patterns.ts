import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isDissonance, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES, stepsTo, weakNotes, type WeakState } from '@/shared/rules/second-species/folds'

const isConsonance = (now: Sonority): boolean => !isDissonance(now)

export const s2UpbeatConsonantPatterns: Rule<WeakState, NoParams> = {
  id: 's2-upbeat-consonant-patterns',
  level: 'preference',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...weakNotes<NoParams>(isConsonance, (from, at, to) =>
    from === null || to === null || isPattern(stepsTo(from, at), stepsTo(at, to))
      ? null
      : breachAt('other', [from, at, to], {}, 'line'),
  ),
  explain: {
    title: 'Consonant upbeats with a purpose',
    statement:
      'A consonant second half fills or decorates the way from one downbeat to the next: it passes by step, takes a step and a third one way, divides a fifth or sixth into two leaps, leaps a fourth and steps back, leaps a third and steps back, leaps wide and steps back into the gap, or steps out and back.',
    why: 'What the ear follows is the line of the downbeats. A second half that belongs to one of these shapes carries that line; any other wanders off.',
    mends: 'Let the leap come inside the bar and a step back follow it.',
    sources: cite('OMT1 (terms from Salzer and Schachter)'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,C5:2 G4:2,C#5:2 D5', [3, 4]),
    messages: {
      other: 'The second half of the bar belongs to none of the usual shapes between two downbeats.',
    },
  },
}

/** Whether two moves, in signed steps, make one of the shapes named in the statement. */
function isPattern(first: number, second: number): boolean {
  const wide = Math.abs(first)
  const then = Math.abs(second)
  if (wide === 0 || then === 0) return false
  if (Math.sign(first) === Math.sign(second)) {
    const isSubdivision = wide >= 2 && then >= 2 && (wide + then === 4 || wide + then === 5)
    return wide + then <= 3 || isSubdivision
  }
  // Out and back: a neighbour by step, or a leap of any size with a step back.
  return then === 1
}
