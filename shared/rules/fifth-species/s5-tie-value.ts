import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES, onsetPairs, type OnsetState } from '@/shared/rules/fifth-species/folds'
import { breachAt } from '@/shared/rules/first-species/sonority'
import { isTiedOver, ticksInBar } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { QUARTER_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  preparation: z
    .int()
    .min(1)
    .max(4)
    .default(2)
    .describe('The shortest note that may be tied over, in quarters.'),
  longToShort: z
    .boolean()
    .default(true)
    .describe('A note is tied to one of its own length or a shorter one.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5TieValue: Rule<OnsetState, Params> = {
  id: 's5-tie-value',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  ...onsetPairs<Params>((before, now, { params }) => {
    if (!isTiedOver(now)) return null
    if (ticksInBar(before) < params.preparation * QUARTER_TICKS) {
      return breachAt('short', [before, now], { count: params.preparation }, 'line')
    }
    const isLonger = params.longToShort && ticksInBar(before) < ticksInBar(now)
    return isLonger ? breachAt('longer', [before, now], {}, 'line') : null
  }),
  explain: {
    title: 'Ties go from long to short',
    statement: 'A tie joins a half note or longer to a note of the same length or a shorter one.',
    why: 'The dissonance needs a preparation long enough to be heard at rest, and should not outlast it.',
    mends: 'Lengthen the note before the bar line, or shorten the one after it.',
    sources: cite('LEHM IX', 'FLASH', 'JEPP°', 'EX'),
    right: example('r:2,A4:2~ A4:1,C5:1,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,B4:1,C5:1,D5:1~ D5:2,C#5:2 D5', [3]),
    messages: {
      short: 'The note that is tied over is shorter than {count} quarters.',
      longer: 'The note is tied to a longer one.',
    },
  },
}
