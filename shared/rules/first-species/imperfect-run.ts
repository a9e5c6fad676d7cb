import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { HEARD_ON_DOWNBEATS } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  isSixth,
  isThird,
  sharedDirection,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  max: z.int().min(1).max(12).default(3).describe('Thirds or sixths in a row.'),
  counting: z
    .enum(['in-a-row', 'parallel'])
    .default('in-a-row')
    .describe('All that follow each other, or only those to which both voices move the same way.'),
})
type Params = z.infer<typeof PARAMS>

/** The thirds, or the sixths, that have just followed each other; one more than the limit is kept at most. */
type State = Readonly<{ run: readonly Sonority[]; isPlaceNeeded: boolean }>
const NONE: readonly Sonority[] = []

export const imperfectRun: Rule<State, Params> = {
  id: 'imperfect-run',
  level: 'preference',
  scope: 'pair',
  species: HEARD_ON_DOWNBEATS,
  params: PARAMS,
  start: (_exercise, { counting }) => ({ run: NONE, isPlaceNeeded: counting === 'parallel' }),
  step: (state, moment, { max, counting }) => {
    // What sounds off the downbeat neither makes a run nor breaks it.
    if (moment.place !== 0) return goOn(state)
    const now = sonorityOf(moment)
    if (now === null || !(isThird(now) || isSixth(now)))
      return goOn({ run: NONE, isPlaceNeeded: state.isPlaceNeeded })
    const before = state.run.at(-1)
    const goesOn =
      before !== undefined &&
      before.simpleSteps === now.simpleSteps &&
      (counting === 'in-a-row' || sharedDirection(before, now) !== 0)
    const run = goesOn ? [...state.run.slice(-max), now] : [now]
    const code = isThird(now) ? 'thirds' : 'sixths'
    return {
      state: { run, isPlaceNeeded: state.isPlaceNeeded },
      breach: run.length > max ? breachAt(code, run, { count: run.length, max }) : null,
    }
  },
  finish: () => null,
  key: ({ run, isPlaceNeeded }) => {
    const last = run.at(-1)
    return pack(
      [run.length, 16],
      [last === undefined ? 0 : last.simpleSteps, 7],
      [isPlaceNeeded ? packPitch(last?.note ?? null) : 0, PITCH_ROOM],
    )
  },
  explain: {
    title: 'Not too many thirds or sixths in a row',
    statement: 'Thirds, or sixths, follow each other only a few times; tenths count as thirds.',
    why: 'In a long row of thirds the line only shadows the cantus and has no will of its own.',
    mends: 'Break the row: move against the cantus to another interval.',
    sources: cite('OMT1', 'RUSH I', 'LEHM I', 'DAVD', 'JEPP°', 'S&S°', 'EX'),
    disagreement: 'Most sources allow three in a row, two allow four.',
    right: {
      cantus: 'D4 F4 G4 A4 F4 E4 D4',
      line: 'A4 A4 B4 C5 D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 G4 A4 F4 E4 D4',
      line: 'A4 A4 B4 C5 A4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [5],
    },
    messages: {
      thirds: 'This makes {count} thirds in a row.',
      sixths: 'This makes {count} sixths in a row.',
    },
  },
}
