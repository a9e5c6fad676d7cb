import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { isSixFour } from '@/shared/rules/three-voices/six-four'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

const PARAMS = z.strictObject({
  cadential: z.boolean().default(false).describe('A six-four may stand in the last bar but one.'),
})
type Params = z.infer<typeof PARAMS>

export const v3SixFour: Rule<Exercise, Params> = {
  id: 'v3-six-four',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: PARAMS,
  ...eachChord<Params>((now, { params }) => {
    if (!isSixFour(now) || (params.cadential && now.isPenultimate)) return null
    return breachAt('six-four', [now])
  }),
  explain: {
    title: 'No six-four',
    statement: 'No chord has its fifth in the bass.',
    why: 'The fourth over the bass wants to fall, and a chord that wants to move is no place to stand.',
    mends: 'Let the bass take the root or the third.',
    sources: cite('SOTON', 'BRIDGE', 'LEHM XI'),
    disagreement: 'One school book lets the six-four of tonal cadences pass.',
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 D5 C#5 D5', 'F4 Bb4 G4 A4', [2]),
    messages: {
      'six-four': 'The voices make a six-four chord.',
    },
  },
}
