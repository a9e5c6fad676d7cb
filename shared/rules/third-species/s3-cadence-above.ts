import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import { cadence, type CadenceState } from '@/shared/rules/third-species/cadence'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  formulas: z
    .array(z.enum(['3456', '8756', 'half']))
    .default(['3456', '8756'])
    .describe('Formulas of the last bar but one; none: only its last note is fixed.'),
})
type Params = z.infer<typeof PARAMS>

export const s3CadenceAbove: Rule<CadenceState, Params> = {
  id: 's3-cadence-above',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...cadence<Params>('above', ({ formulas }) => formulas),
  explain: {
    title: 'The close above: 3–4–5–6',
    statement:
      'Over a cantus that falls 2–1 the last bar but one climbs 3–4–5–6 into the octave, or comes as a cambiata, 8–7–5–6. Over a cantus that rises 7–1 the line ends the bar on 2.',
    why: 'The scale runs straight into the leading tone, and the ear knows where it is going.',
    mends: 'Climb by step from the third over the cantus to the major sixth.',
    sources: cite('SOLON', 'MT21C', 'FUX°', 'FLASH', 'OMT1', 'EX Figs 55, 57, 59'),
    disagreement:
      'The open textbook fixes only the last note; one course lets the bar end with a half note; the older books know these formulas.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,G4:1,A4:1,F4:1 E4:1,G4:1,B4:1,C#5:1 D5', [3]),
    messages: {
      'not-leading':
        'Before the close the voices sound a {interval}, not a major sixth that opens to the octave.',
      'wrong-size': 'Before the close the voices sound a {interval}, where the sixth must be major.',
      'not-second':
        'The cantus rises to its final from below, and the line does not come down to it by step.',
      'not-second.mend': 'End the bar on the second degree, so that the line falls by step to the final.',
      'other-formula': 'The last bar but one goes {figures}, which is none of the usual closes.',
    },
  },
}
