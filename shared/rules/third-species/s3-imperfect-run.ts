import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, isSixth, isThird, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { exampleIn } from '@/shared/rules/example-in'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  max: z
    .int()
    .min(1)
    .max(12)
    .default(3)
    .describe('Bars in a row that may begin with thirds, or with sixths.'),
})
type Params = z.infer<typeof PARAMS>

/** The thirds, or the sixths, with which bars in a row began; one more than the limit is kept at most. */
type State = Readonly<{ run: readonly Sonority[] }>
const NONE: State = { run: [] }

/** Takes the place of `imperfect-run`. */
export const s3ImperfectRun: Rule<State, Params> = {
  id: 's3-imperfect-run',
  level: 'preference',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { max }) => {
    if (moment.place !== 0) return goOn(state)
    const now = sonorityOf(moment)
    if (now === null || !(isThird(now) || isSixth(now))) return goOn(NONE)
    const goesOn = state.run.at(-1)?.simpleSteps === now.simpleSteps
    const run = goesOn ? [...state.run.slice(-max), now] : [now]
    return {
      state: { run },
      breach:
        run.length > max ? breachAt(isThird(now) ? 'thirds' : 'sixths', run, { count: run.length }) : null,
    }
  },
  finish: () => null,
  key: ({ run }) => pack([run.length, 16], [run.at(-1)?.simpleSteps ?? 0, 7]),
  explain: {
    title: 'Not too many bars that begin alike',
    statement: 'Only a few bars in a row begin with thirds, or with sixths; tenths count as thirds.',
    why: 'Where every bar begins with the same interval the line only follows the cantus, however much it moves between.',
    mends: 'Begin one of the bars with another consonance.',
    sources: cite('OMT1', 'EX'),
    disagreement: 'One textbook sets three as the limit; Fux goes to six.',
    right: shortExample(SHORT_LINE),
    wrong: exampleIn(3, 'D4 F4 E4 D4')(
      'F4:1,E4:1,F4:1,G4:1 A4:1,G4:1,F4:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5',
      [2, 3],
      { params: { max: 1 } },
    ),
    messages: {
      thirds: '{count} bars in a row begin with thirds.',
      sixths: '{count} bars in a row begin with sixths.',
    },
  },
}
