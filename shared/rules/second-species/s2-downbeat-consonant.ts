import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, isDissonance, nameOf, sonorityOf } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

const PARAMS = z.strictObject({
  spared: z
    .int()
    .min(0)
    .max(12)
    .default(0)
    .describe('Dissonant downbeats in a line that are let pass, to save its flow.'),
})
type Params = z.infer<typeof PARAMS>

/** How many dissonant downbeats there have been; none is counted past those spared. */
type State = Readonly<{ found: number }>

export const s2DownbeatConsonant: Rule<State, Params> = {
  id: 's2-downbeat-consonant',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => ({ found: 0 }),
  step: (state, moment, { spared }) => {
    const now = moment.place === 0 ? sonorityOf(moment) : null
    if (now === null || !isDissonance(now)) return goOn(state)
    if (state.found < spared) return goOn({ found: state.found + 1 })
    return { state, breach: breachAt('dissonant', [now], { interval: nameOf(now) }) }
  },
  finish: () => null,
  key: ({ found }) => found,
  explain: {
    title: 'Consonant downbeats',
    statement: 'The first half of every bar is a consonance.',
    why: 'The downbeat carries the harmony. A dissonance there is heard as a clash; in the second half it is heard on its way.',
    mends: 'Move the note by a step, to the nearest third, fifth, sixth or octave.',
    sources: cite('OMT1', 'FUXE', 'CHER r10', 'BRIDGE', 'NOTAV II', 'GROVE'),
    disagreement:
      'Three books of the nineteenth century let a dissonant downbeat pass now and then, to save the flow of the line.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 Bb4:2,A4:2 B4:2,C#5:2 D5', [2]),
    messages: { dissonant: 'The bar begins with a {interval}, a dissonance.' },
  },
}
