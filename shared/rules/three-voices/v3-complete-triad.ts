import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

const PARAMS = z.strictObject({
  endsMayBeEmpty: z.boolean().default(true).describe('The first and last chord may lack a note.'),
})
type Params = z.infer<typeof PARAMS>

export const v3CompleteTriad: Rule<Exercise, Params> = {
  id: 'v3-complete-triad',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: PARAMS,
  ...eachChord<Params>((now, { params }) => {
    if (params.endsMayBeEmpty && (now.isFirst || now.isLast)) return null
    const letters = new Set(now.voices.map(({ letter }) => letter))
    return letters.size === 3 ? null : breachAt('incomplete', [now])
  }),
  explain: {
    title: 'Full chords',
    statement: 'Three voices make a full triad wherever the lines allow it.',
    why: 'Two notes and a doubling leave a hole where a third note could sound.',
    mends: 'Let one of the doubled voices take the missing third or fifth.',
    sources: cite('SOTON', 'LEHM XI', 'BRIDGE ch.6', 'FUX°'),
    disagreement: 'One school book makes it nearly a law outside the first and last bars.',
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 F5 C#5 D5', RIGHT_SECOND, [2]),
    messages: {
      incomplete: 'The chord is not complete: two voices have the same note.',
    },
  },
}
