import { cite } from '@/shared/rules/cite'
import { neighbours, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, cantusSpan, lineSpan, perfectKindOf, sizeOf } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

export const bothLeapPerfect: Rule<NeighbourState, NoParams> = {
  id: 'both-leap-perfect',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...neighbours((before, now) =>
    perfectKindOf(now) !== null && lineSpan(before, now) >= 2 && cantusSpan(before, now) >= 2
      ? breachAt('both-leap', [before, now], { interval: sizeOf(now) })
      : null,
  ),
  explain: {
    title: 'Do not leap into a perfect consonance together',
    statement: 'A fifth, octave or unison is not entered by both voices leaping, even in contrary motion.',
    why: 'A leap draws the ear to where it lands. Two leaps landing on a bare consonance make it stick out.',
    mends: 'Let the line come by step, or land on a third or sixth.',
    sources: cite('LEHM I', 'RUSH I'),
    right: { cantus: 'D4 F4 D4 E4 D4', line: 'A4 A4 B4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 D4 E4 D4', line: 'A4 A4 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { 'both-leap': 'Both voices leap into a {interval}.' },
  },
}
