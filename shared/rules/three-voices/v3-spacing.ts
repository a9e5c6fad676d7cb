import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { goOn } from '@/shared/rules/fold'
import { intervalBetween } from '@/shared/theory/interval'
import type { Rule } from '@/shared/rules/rule'
import { breachAt, type Chord, chordOf, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

const PARAMS = z.strictObject({
  max: z.int().min(5).max(15).default(8).describe('Widest interval between the upper voices.'),
  outer: z.int().min(5).max(15).default(10).describe('Widest interval for a short time.'),
  brief: z.int().min(0).max(12).default(2).describe('Chords in a row that may be so wide.'),
})
type Params = z.infer<typeof PARAMS>

/** The chords in a row that have been too wide. */
type State = Readonly<{ run: readonly Chord[] }>

export const v3Spacing: Rule<State, Params> = {
  id: 'v3-spacing',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: PARAMS,
  start: () => ({ run: [] }),
  step: (state, moment, { max, outer, brief }) => {
    const now = chordOf(moment)
    if (now === null) return goOn({ run: [] })
    const size = intervalBetween(now.middle, now.top).steps + 1
    if (size <= max) return goOn({ run: [] })
    const run = [...state.run.slice(-brief), now]
    if (size > outer) return { state: { run }, breach: breachAt('too-far', [now]) }
    return { state: { run }, breach: run.length > brief ? breachAt('too-long', run) : null }
  },
  finish: () => null,
  key: ({ run }) => run.length,
  explain: {
    title: 'Upper voices keep together',
    statement: 'The two upper voices stay within an octave of each other, or a tenth for a chord or two.',
    why: 'Far apart they fall into a high voice and a low pair. Near each other they make one chord over the bass.',
    mends: 'Bring the upper voices nearer to each other.',
    sources: cite('LEHM XI'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('D6 A5 C#5 D5', 'F4 A4 G4 D4', [1]),
    messages: {
      'too-far': 'The two upper voices are too far apart.',
      'too-long': 'The two upper voices have been more than an octave apart for too long.',
    },
  },
}
