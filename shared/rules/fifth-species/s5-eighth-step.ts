import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import {
  FIFTH_SPECIES,
  isEighth,
  isOnQuarter,
  onsetPairs,
  type OnsetState,
} from '@/shared/rules/fifth-species/folds'
import { breachAt, lineSpan } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  entry: z.enum(['step', 'free']).default('step').describe('How the first eighth of a pair is reached.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5EighthStep: Rule<OnsetState, Params> = {
  id: 's5-eighth-step',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  ...onsetPairs<Params>((before, now, { params }) => {
    if (lineSpan(before, now) === 1) return null
    const args = { note: formatPitch(now.note) }
    if (isEighth(before)) {
      return breachAt(isOnQuarter(before) ? 'inside' : 'left', [before, now], args, 'line')
    }
    const isReached = isEighth(now) && isOnQuarter(now) && now.isStruck && params.entry === 'step'
    return isReached ? breachAt('reached', [before, now], args, 'line') : null
  }),
  explain: {
    title: 'Eighths move by step',
    statement: 'Eighth notes are reached and left by step.',
    why: 'Notes so short are heard as one gesture; a leap tears it apart, and no voice sings it gladly.',
    mends: 'Fill the leap, or write quarters.',
    sources: cite('GIRT', 'LEHM IX', 'CHER', 'RUSH V'),
    disagreement:
      'One school book lets the first eighth be reached by a leap; another lets eighths leap now and then.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,A4:0.5,C#5:2 D5', [3, 3]),
    messages: {
      reached: 'The first of two eighths, {note}, is reached by a leap.',
      inside: 'The second of two eighths, {note}, is reached by a leap.',
      left: 'The second of two eighths is left by a leap, to {note}.',
    },
  },
}
