import { z } from 'zod'
import {
  breachAt,
  cantusMove,
  perfectKindOf,
  sonorityOf,
  type PerfectKind,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

export const RUN_PARAMS = z.strictObject({
  inRow: z
    .int()
    .min(1)
    .max(12)
    .default(1)
    .describe('Bars in a row that may have the same perfect consonance there.'),
})
export type RunParams = z.infer<typeof RUN_PARAMS>

/** The equal perfect consonances at one place of bars in a row; one more than the limit is kept at most. */
export type RunState = Readonly<{ run: readonly Sonority[] }>
const NONE: RunState = { run: [] }

const KINDS: readonly (PerfectKind | null)[] = [null, 'octave', 'fifth']

/** Folds a rule of what sounds at one place of every bar. A bar that has no onset there ends the row. */
export const perfectRuns = (
  place: number,
): Pick<Rule<RunState, RunParams>, 'start' | 'step' | 'finish' | 'key'> => ({
  start: () => NONE,
  step: (state, moment, { inRow }) => {
    if (moment.place !== place) {
      // An unwritten end of a bar may hide what stands at the place.
      return goOn(moment.note === null && moment.place < place ? NONE : state)
    }
    const now = sonorityOf(moment)
    const kind = now && perfectKindOf(now)
    if (now === null || kind === null) return goOn(NONE)
    const before = state.run.at(-1)
    // Where the cantus repeats its note nothing moves in parallel.
    const goesOn = before !== undefined && perfectKindOf(before) === kind && cantusMove(before, now) !== 0
    const run = goesOn ? [...state.run.slice(-inRow), now] : [now]
    const code = kind === 'fifth' ? 'fifths' : 'octaves'
    return {
      state: { run },
      breach: run.length > inRow ? breachAt(code, run, { count: run.length }) : null,
    }
  },
  finish: () => null,
  key: ({ run }) => {
    const last = run.at(-1)
    return pack([run.length, 16], [KINDS.indexOf(last === undefined ? null : perfectKindOf(last)), 3])
  },
})
