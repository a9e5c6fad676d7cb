import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import {
  afterSome,
  FOURTH_SPECIES,
  isStepUp,
  isSuspension,
  type AfterState,
} from '@/shared/rules/fourth-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { semitonesFrom } from '@/shared/theory/interval'
import { isFinal } from '@/shared/theory/scale'

const PARAMS = z.strictObject({
  leadingTone: z.boolean().default(false).describe('The leading tone may rise a semitone to the final.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4Retardation: Rule<AfterState, Params> = {
  id: 's4-retardation',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: PARAMS,
  ...afterSome<Params>(isSuspension, (before, now, { exercise, params }) => {
    if (!isStepUp(before, now) || (params.leadingTone && leads(before, now, exercise))) return null
    return breachAt('rises', [before, now], { interval: nameOf(before) }, 'line')
  }),
  explain: {
    title: 'A held dissonance does not rise',
    statement: 'A dissonance that was held over does not resolve upwards.',
    why: 'The cantus has pressed upon the held note; giving way means going down. A dissonance that rises seems to win.',
    mends: 'Fall by step, or choose another note to hold.',
    sources: cite('LEHM VI', 'OMT1', 'GROVE', 'NOTAV IV-ii'),
    disagreement: 'One school book lets the leading tone rise a semitone to the final.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:2~ D5:2,E5:2 D5', [3]),
    messages: { rises: 'The held {interval} resolves upwards.' },
  },
}

const leads = (before: Sonority, now: Sonority, { final }: Exercise): boolean =>
  semitonesFrom(before.note, now.note) === 1 && isFinal(now.note, final)
