import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import { FOURTH_SPECIES, isSuspension } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  percent: z
    .int()
    .min(0)
    .max(100)
    .default(33)
    .describe('Share of the inner downbeats that are to be dissonant. No source gives a number.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{ inner: number; others: readonly Sonority[] }>

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4SuspensionQuota: Rule<State, Params> = {
  id: 's4-suspension-quota',
  level: 'preference',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: PARAMS,
  start: () => ({ inner: 0, others: [] }),
  step: (state, moment) => {
    const now = sonorityOf(moment)
    if (now === null || now.place !== 0 || now.isFirst || now.isLast) return goOn(state)
    const { inner, others } = state
    return goOn({ inner: inner + 1, others: isSuspension(now) ? others : [...others, now] })
  },
  finish: ({ inner, others }, { percent }, isComplete) =>
    isComplete && others.length > 0 && 100 * (inner - others.length) < percent * inner
      ? breachAt('too-few', others, { count: inner - others.length, of: inner })
      : null,
  key: ({ inner, others }) => pack([inner, 256], [others.length, 256]),
  explain: {
    title: 'As many suspensions as can be',
    statement: 'Of the notes held over, as many as possible become dissonances.',
    why: 'The dissonance on the beat is what this species is there to teach; consonant ties are for getting to the next one.',
    mends: 'Look for held notes that become a seventh or a fourth above, or a second below.',
    sources: cite('OMT1', 'LIST', 'LEHM VI'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,C5:2~ C5:2,C#5:2 D5', [3]),
    messages: { 'too-few': 'Of {of} inner bars {count} begin with a suspension.' },
  },
}
