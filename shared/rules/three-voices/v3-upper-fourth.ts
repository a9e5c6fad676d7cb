import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { asRemark } from '@/shared/rules/fold'
import { intervalBetween, isConsonant, simpleInterval } from '@/shared/theory/interval'
import { nameInterval } from '@/shared/theory/interval-name'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

const PARAMS = z.strictObject({
  granted: z.boolean().default(true).describe('Fourths and tritones between upper voices are let pass.'),
  diminishedFifth: z
    .enum(['free', 'remark'])
    .default('remark')
    .describe('What is said of a diminished fifth there.'),
})
type Params = z.infer<typeof PARAMS>

export const v3UpperFourth: Rule<Exercise, Params> = {
  id: 'v3-upper-fourth',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: PARAMS,
  ...eachChord<Params>((now, { params }) => {
    const interval = simpleInterval(intervalBetween(now.middle, now.top))
    if (isConsonant(interval) || !now.overBass.every(isConsonant)) return null
    const args = { interval: nameInterval(interval) }
    if (interval.steps !== 3 && interval.steps !== 4) return breachAt('second', [now], args)
    if (!params.granted) return breachAt('fourth', [now], args)
    const isAwkward = interval.steps === 4 && params.diminishedFifth === 'remark'
    return isAwkward ? asRemark(breachAt('awkward', [now], args)) : null
  }),
  explain: {
    title: 'Fourths between the upper voices',
    statement:
      'Two upper voices may make a fourth or a tritone if both agree with the bass; they do not make a second or a seventh.',
    why: 'Over a bass that carries both of them a fourth is only the other side of a fifth. A second still rubs.',
    mends: 'Let one of the upper voices take another note over the bass.',
    sources: cite('SOTON', 'BRIDGE ch.6', 'FUX°'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 C5 C#5 D5', 'F4 D5 G4 A4', [2], { cantus: 'D4 F4 E4 D4' }),
    messages: {
      second: 'The upper voices make a {interval} between them.',
      fourth: 'The upper voices make a {interval}, which this rule set does not use.',
      awkward: 'The upper voices make a {interval}, which is awkward between them.',
    },
  },
}
