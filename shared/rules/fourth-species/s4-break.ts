import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  times: z.int().min(0).max(99).default(99).describe('How often in a line the ties may stop.'),
  bars: z.int().min(1).max(99).default(2).describe('Bars in a row that may begin without a tie.'),
})
type Params = z.infer<typeof PARAMS>

/** How often the ties have stopped, and the downbeats in a row that were just struck. */
type State = Readonly<{ breaks: number; run: readonly Sonority[]; isBegun: boolean }>

const example = exampleIn(4, 'D4 F4 E4 D4 F4 E4 D4')

export const s4Break: Rule<State, Params> = {
  id: 's4-break',
  level: 'preference',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: PARAMS,
  start: () => ({ breaks: 0, run: [], isBegun: false }),
  step: (state, moment, { times, bars }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn({ breaks: state.breaks, run: [], isBegun: false })
    // The last note is struck of right: before it the leading tone has come, which nothing holds.
    if (now.place !== 0 || now.isLast || !state.isBegun) return goOn({ ...state, isBegun: true })
    if (!now.isStruck) return goOn({ ...state, run: [] })
    const run = [...state.run.slice(-bars), now]
    const breaks = state.run.length > 0 ? state.breaks : Math.min(state.breaks + 1, times + 1)
    const code = breaks > times ? (times === 0 ? 'never' : 'again') : run.length > bars ? 'long' : null
    return {
      state: { breaks, run, isBegun: true },
      breach: code === null ? null : breachAt(code, code === 'long' ? run : [now], { count: bars }, 'line'),
    }
  },
  finish: () => null,
  key: ({ breaks, run, isBegun }) => pack([breaks, 128], [run.length, 128], [isBegun ? 1 : 0, 2]),
  explain: {
    title: 'Ties stop only for a moment',
    statement: 'Where no tie is possible the line may go on in plain half notes for a bar or two.',
    why: 'Sometimes nothing that could be held agrees with the next bar. But the ties are what this species is about, and the line should come back to them.',
    mends: 'Choose a second half that can be held into the next bar.',
    sources: cite('OMT1', 'DAVID', 'FUX°', 'EX'),
    disagreement:
      'One textbook allows a single break in an exercise; Fux breaks off in two of his solutions.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5', [], { cantus: 'D4 F4 E4 D4' }),
    wrong: example('r:2,A4:2 A4:2,D5:2 B4:2,G4:2 F4:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5', [4]),
    messages: {
      long: 'More than {count} bars in a row begin without a tie.',
      again: 'This bar begins without a tie, and the ties have stopped often enough.',
      never: 'This bar begins without a tie.',
    },
  },
}
