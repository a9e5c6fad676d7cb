import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, foldPairs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { HALF_TICKS } from '@/shared/theory/duration'
import { stepsFrom } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  from: z.int().min(3).max(8).default(3).describe('The smallest leap that is told: 3 for a third.'),
})
type Params = z.infer<typeof PARAMS>

export const s3LeapUpAccent: Rule<OneBehind, Params> = {
  id: 's3-leap-up-accent',
  level: 'preference',
  scope: 'line',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...foldPairs<Params>((before, now, { from }) => {
    const steps = stepsFrom(before.note, now.note)
    const isOffAccent = before.place % HALF_TICKS === 0 && now.place % HALF_TICKS !== 0
    if (!isOffAccent || steps + 1 < from) return null
    return breachAt('line', 'leaps', [before, now], { interval: nameSize(steps) })
  }),
  explain: {
    title: 'No leap up from an accent',
    statement: 'The line does not leap upward from the first or third quarter to the one after it.',
    why: 'A leap up lends weight to the note it reaches; on an unaccented quarter that goes against the beat. In the vocal style of the sixteenth century it is hardly met.',
    mends: 'Leap up from a weak quarter to a strong one, or step.',
    sources: cite('JEPP°'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,F4:1,E4:1,F4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [1]),
    messages: { leaps: 'The line leaps up a {interval} from an accented quarter.' },
  },
}
