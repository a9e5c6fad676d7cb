import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { EIGHTH_TICKS, FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { breachAt, goOn, pack } from '@/shared/rules/fold'
import { ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { QUARTER_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  quarters: z
    .int()
    .min(2)
    .max(64)
    .default(8)
    .describe('How long the line may stay in one value, in quarters.'),
})
type Params = z.infer<typeof PARAMS>

/** The onsets of one value that have just followed each other, their length in eighths, and whether it was told. */
type State = Readonly<{ run: readonly Sonority[]; value: number; eighths: number; isTold: boolean }>
const NONE: State = { run: [], value: 0, eighths: 0, isTold: false }

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5ValueRun: Rule<State, Params> = {
  id: 's5-value-run',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { quarters }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    const value = Math.round(ticksInBar(now) / EIGHTH_TICKS)
    if (value !== state.value) return goOn({ run: [now], value, eighths: value, isTold: false })
    if (state.isTold) return goOn(state)
    const run = [...state.run, now]
    const eighths = state.eighths + value
    if (eighths * EIGHTH_TICKS <= quarters * QUARTER_TICKS)
      return goOn({ run, value, eighths, isTold: false })
    return {
      state: { run: [], value, eighths: 0, isTold: true },
      breach: breachAt('line', 'too-long', run, { count: quarters }),
    }
  },
  finish: () => null,
  key: ({ value, eighths, isTold }) => pack([value, 32], [eighths, 512], [isTold ? 1 : 0, 2]),
  explain: {
    title: 'Change the values',
    statement: 'The line does not stay long in one value.',
    why: 'Two bars of quarters sound like third species, two of ties like fourth. The rhythm of this species is that it changes.',
    mends: 'Put a half note, a tie or some quarters into the row.',
    sources: cite('LEHM IX', 'RUSH V', 'E2-5'),
    disagreement:
      'One school book allows a bar and a half, others only say not too long; one asks for another rhythm in every bar.',
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,G4:1,A4:1,B4:1 C5:1,B4:1,C5:1,D5:1 D5', [3], { params: { quarters: 6 } }),
    messages: { 'too-long': 'The line stays in one value for more than {count} quarters.' },
  },
}
