import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import { cadence, type CadenceState } from '@/shared/rules/third-species/cadence'
import { shortExample } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  formulas: z
    .array(z.enum(['3543', '6543', 'half']))
    .default(['3543'])
    .describe(
      'Formulas of the last bar but one, in Phrygian 6363 instead; none: only its last note is fixed.',
    ),
})
type Params = z.infer<typeof PARAMS>

export const s3CadenceBelow: Rule<CadenceState, Params> = {
  id: 's3-cadence-below',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...cadence<Params>('below', ({ formulas }, { mode }) =>
    // Under the second degree of Phrygian there is no perfect fifth.
    mode === 'phrygian' && formulas.length > 0
      ? [...formulas.filter((one) => one === 'half'), '6363']
      : formulas,
  ),
  explain: {
    title: 'The close below: 3–5–4–3',
    statement:
      'Under a cantus that falls 2–1 the last bar but one goes 3–5–4–3 into the unison, in Phrygian 6–3–6–3. Under a cantus that rises 7–1 the line ends the bar on 2.',
    why: 'The leading tone sounds at both ends of the bar, and the notes between lead back to it.',
    mends: 'Begin on the leading tone, fall to the fifth under the cantus, and step back up.',
    sources: cite('MT21C', 'SOLON', 'EX Figs 56, 58, 59b'),
    disagreement: 'One course book writes 6–5–4–3; the open textbook fixes only the last note.',
    right: shortExample('D4:1,C4:1,B3:1,G3:1 A3:1,F3:1,A3:1,D4:1 C#4:1,A3:1,B3:1,C#4:1 D4', [], {
      position: 'below',
    }),
    wrong: shortExample('D4:1,C4:1,B3:1,A3:1 F3:1,G3:1,A3:1,B3:1 A3:1,G3:1,A3:1,C#4:1 D4', [3], {
      position: 'below',
    }),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a minor third or tenth that closes to the final.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the third or tenth must be minor.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'End the bar on the second degree, so that the line falls by step to the final.',
      'other-formula': 'The last bar but one goes {figures}, which is none of the usual closes.',
    },
  },
}
