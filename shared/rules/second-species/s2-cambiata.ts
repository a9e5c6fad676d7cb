import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, isDissonance, nameOf } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shapeOfUpbeat } from '@/shared/rules/second-species/dissonant-upbeat'
import { passingExample, PASSING_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES, stepsTo, weakNotes, type WeakState } from '@/shared/rules/second-species/folds'

const PARAMS = z.strictObject({
  allowed: z
    .enum(['no', 'from-below'])
    .default('no')
    .describe('Whether a dissonance that enters a step above a consonance may drop a third.'),
})
type Params = z.infer<typeof PARAMS>

export const s2Cambiata: Rule<WeakState, Params> = {
  id: 's2-cambiata',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  ...weakNotes<Params>(isDissonance, (from, at, to, { params }) => {
    if (from === null || to === null || shapeOfUpbeat(from, at, to) !== 'dropped-third') return null
    const isFromBelow = stepsTo(from, at) === 1 && !isDissonance(from)
    if (params.allowed === 'from-below' && isFromBelow) return null
    return breachAt('drops', [from, at, to], { interval: nameOf(at) })
  }),
  explain: {
    title: 'No third down out of a dissonance',
    statement: 'A dissonance in the second half of a bar is not left by a falling third.',
    why: 'The ear expects the dissonance to go on by step; a leap leaves it hanging. With four notes to the bar the figure has room to turn back, here it has not.',
    mends: 'Go on by step to the next consonance.',
    sources: cite('OMT1', 'NOTAV II-i-3'),
    disagreement:
      'One set of school rules allows it when the note enters a step above a consonance and drops a third.',
    right: passingExample(PASSING_LINE),
    wrong: passingExample('r:2,D5:2 B4:2,A4:2 F4:2,G4:2 B4:2,C#5:2 D5', [3]),
    messages: { drops: 'The {interval} in the second half of the bar is a dissonance and drops a third.' },
  },
}
