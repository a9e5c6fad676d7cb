import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { eachSonority } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { asRemark } from '@/shared/rules/fold'
import { isAboveCantus, isSuspension, TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import { suspensionBelow, suspensionList, SUSPENSIONS_BELOW } from '@/shared/rules/fourth-species/suspension'
import type { Exercise, Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  allowed: suspensionList(
    SUSPENSIONS_BELOW,
    ['2-3', '4-5'],
    'Suspensions that may be used under the cantus.',
  ),
  secondBest: suspensionList(SUSPENSIONS_BELOW, [], 'Suspensions that are let pass with a remark.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** Told where the note is held: what it resolves to, and whether it does, is the matter of other rules. */
export const s4SetBelow: Rule<Exercise, Params> = {
  id: 's4-set-below',
  level: 'law',
  scope: 'pair',
  species: TIED_SPECIES,
  params: PARAMS,
  ...eachSonority<Params>((now, { params }) => {
    if (!isSuspension(now) || !!isAboveCantus(now)) return null
    const figure = suspensionBelow(now)
    if (figure === null || params.allowed.includes(figure)) return null
    const args = { figure: figure.replace('-', '–') }
    return params.secondBest.includes(figure)
      ? asRemark(breachAt('second-best', [now], args))
      : breachAt('not-allowed', [now], args)
  }),
  explain: {
    title: 'Suspensions below the cantus',
    statement:
      'Below the cantus a held note may be a second that falls to the third, or a fourth that falls to the fifth.',
    why: 'A second opens to the third and is the plainest of all; a seventh would fall to the octave and leave a hole where the dissonance was.',
    mends: 'Hold a note that becomes a second under the cantus.',
    sources: cite('NOTAV', 'LEHM', 'OMT1', 'DAVID', 'FUX°', 'JEPP°', 'EX'),
    disagreement:
      'The stricter schools allow 2–3 alone; Fux and today’s textbooks have 4–5 as well. All avoid 7–8.',
    right: example('r:2,D3:2~ D3:2,D4:2~ D4:2,C#4:2 D4', [], { position: 'below' }),
    wrong: example('r:2,D4:2~ D4:2,F3:2~ F3:2,E3:2 D3', [3], { position: 'below' }),
    messages: {
      'not-allowed': 'The held note makes a {figure} under the cantus, which this rule set does not use.',
      'second-best': 'The held note makes a {figure} under the cantus, which is used rarely.',
    },
  },
}
