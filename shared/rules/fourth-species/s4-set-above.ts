import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { eachSonority } from '@/shared/rules/first-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { asRemark } from '@/shared/rules/fold'
import { isAboveCantus, isSuspension, TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import { suspensionAbove, suspensionList, SUSPENSIONS_ABOVE } from '@/shared/rules/fourth-species/suspension'
import type { Exercise, Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  allowed: suspensionList(
    SUSPENSIONS_ABOVE,
    ['7-6', '4-3', '9-8'],
    'Suspensions that may be used over the cantus.',
  ),
  secondBest: suspensionList(SUSPENSIONS_ABOVE, [], 'Suspensions that are let pass with a remark.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** Told where the note is held: what it resolves to, and whether it does, is the matter of other rules. */
export const s4SetAbove: Rule<Exercise, Params> = {
  id: 's4-set-above',
  level: 'law',
  scope: 'pair',
  species: TIED_SPECIES,
  params: PARAMS,
  ...eachSonority<Params>((now, { params }) => {
    if (!isSuspension(now) || !isAboveCantus(now)) return null
    const figure = suspensionAbove(now)
    if (figure === null || params.allowed.includes(figure)) return null
    const args = { figure: figure.replace('-', '–') }
    return params.secondBest.includes(figure)
      ? asRemark(breachAt('second-best', [now], args))
      : breachAt('not-allowed', [now], args)
  }),
  explain: {
    title: 'Suspensions above the cantus',
    statement:
      'Above the cantus a held note may be a seventh that falls to the sixth, a fourth that falls to the third, or a ninth that falls to the octave.',
    why: 'These fall to intervals that sound settled. A second that falls to the unison empties the music, and a fifth that falls to a fourth does not resolve at all.',
    mends: 'Hold a note that becomes a seventh or a fourth over the cantus.',
    sources: cite('OMT1', 'NOTAV IV-iii', 'MT21C', 'LEHM VI', 'DAVID', 'FLASH', 'JEPP°', 'EX'),
    disagreement:
      'Two schools leave out 9–8, and one calls it rare; 2–1 is left out by one textbook and used a little by others.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,F4:2~ F4:2,E4:2 D4', [3]),
    messages: {
      'not-allowed': 'The held note makes a {figure} over the cantus, which this rule set does not use.',
      'second-best': 'The held note makes a {figure} over the cantus, which is used rarely.',
    },
  },
}
