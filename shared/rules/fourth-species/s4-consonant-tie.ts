import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, isDissonance, lineSpan } from '@/shared/rules/first-species/sonority'
import { afterSome, FOURTH_SPECIES, isTiedOver, type AfterState } from '@/shared/rules/fourth-species/folds'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  motion: z
    .enum(['free', 'step'])
    .default('free')
    .describe('How a consonant note that was held over goes on: by any melodic interval, or by step alone.'),
})
type Params = z.infer<typeof PARAMS>

const example = exampleIn(4, 'D4 F4 E4 D4')

/** That the next note is consonant is the matter of `s4-upbeat-consonant`. */
export const s4ConsonantTie: Rule<AfterState, Params> = {
  id: 's4-consonant-tie',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: PARAMS,
  ...afterSome<Params>(
    (now) => isTiedOver(now) && !isDissonance(now),
    (before, now, { params }) => {
      const span = lineSpan(before, now)
      const args = { note: formatPitch(before.note) }
      if (span === 0) return breachAt('stays', [before, now], args, 'line')
      return params.motion === 'step' && span > 1 ? breachAt('leaps', [before, now], args, 'line') : null
    },
  ),
  explain: {
    title: 'A consonant tie moves on freely',
    statement:
      'A note held over that is still consonant may go on by step or by leap, up or down, to another consonance. It does move.',
    why: 'Nothing has to be resolved, so the line may use the moment to go where it likes. If it stays, rhythm and line both stand still.',
    mends: 'Go on to another note that agrees with the cantus.',
    sources: cite('MT21C', 'LIST', 'NOTAV IV-iv', 'GROVE', 'LEHM VI', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,A4:2~ A4:2,C#5:2 D5', [2]),
    messages: {
      stays: 'The {note} is held over, and then struck again instead of moving on.',
      leaps: 'The {note} is held over as a consonance and then left by a leap.',
    },
  },
}
