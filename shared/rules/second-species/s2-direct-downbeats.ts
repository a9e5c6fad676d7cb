import { cite } from '@/shared/rules/cite'
import { downbeats, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, perfectKindOf, sharedDirection, sizeOf } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

/** Two perfect consonances of one kind are the matter of `s2-downbeat-perfects`. */
export const s2DirectDownbeats: Rule<NeighbourState, NoParams> = {
  id: 's2-direct-downbeats',
  level: 'preference',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...downbeats((before, now) => {
    const kind = perfectKindOf(now)
    if (kind === null || kind === perfectKindOf(before)) return null
    const direction = sharedDirection(before, now)
    if (direction === 0) return null
    return breachAt(direction > 0 ? 'rise-into' : 'fall-into', [before, now], { interval: sizeOf(now) })
  }),
  explain: {
    title: 'Similar motion from downbeat to downbeat',
    statement: 'From one downbeat to the next the voices do not move the same way into a fifth or octave.',
    why: 'The strong beats taken alone make a first-species line of their own.',
    mends: 'Make the second downbeat a third or a sixth, or come to it against the cantus.',
    sources: cite('FLASH', 'OMT1'),
    disagreement: 'One course checks the strong beats; the open textbook expressly does not.',
    right: shortExample('r:2,A4:2 D5:2,A4:2 C#5 D5'),
    wrong: shortExample(SHORT_LINE, [3]),
    messages: {
      'rise-into': 'From one downbeat to the next both voices rise into a {interval}.',
      'fall-into': 'From one downbeat to the next both voices fall into a {interval}.',
    },
  },
}
