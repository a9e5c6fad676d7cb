import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import { breachAt, sonorityOf } from '@/shared/rules/first-species/sonority'
import { judgeTiedCadence, tiedCadence, type CadenceState } from '@/shared/rules/fourth-species/cadence'
import { ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  cadence: z
    .enum(['suspension', 'clausula'])
    .default('suspension')
    .describe('A suspension before the last bar, or the formula of any species.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(5, 'D4 F4 E4 D4')
const cadence = tiedCadence<Params>((held, now, exercise, params) =>
  params.cadence === 'suspension' ? judgeTiedCadence(held, now, exercise) : judgePenultimate(now, exercise),
)

export const s5Close: Rule<CadenceState, Params> = {
  id: 's5-close',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  ...cadence,
  step: (state, moment, params) => {
    const next = cadence.step(state, moment, params)
    const now = sonorityOf(moment)
    if (now === null || !now.isLast) return next
    const isWhole = now.place === 0 && ticksInBar(now) === WHOLE_TICKS
    return isWhole ? next : { state: next.state, breach: breachAt('last-bar', [now], {}, 'line') }
  },
  explain: {
    title: 'Close with a suspension',
    statement: 'The line ends with a suspension, 7–6–8 above or 2–3–1 below, and a whole note.',
    why: 'After so much movement the delayed leading tone gathers the line, and the whole note stops it.',
    mends:
      'Hold the final over into the last bar but one, fall to the leading tone, and end on a whole note.',
    sources: cite('GIRT', 'OMT2', 'LEHM IX', 'EX'),
    disagreement:
      'Two sources let the line end with the formula of any species. All of Fux’s end with the suspension.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,C5:2~ C5:1,B4:1,C#5:2 D5', [3]),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not the third or sixth that opens to the final.',
      'wrong-size': 'Before the close the voices sound a {interval}, which has the wrong size for the close.',
      'no-suspension': 'The last bar but one does not begin with the final held over.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'Write the second degree, so that the line falls by step to the final.',
      'last-bar': 'The last bar does not hold one whole note.',
    },
  },
}
