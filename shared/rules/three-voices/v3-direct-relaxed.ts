import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import {
  breachAt,
  type Chord,
  chordPairs,
  type ChordState,
  moveOf,
  type Pair,
  pairInterval,
  PAIRS,
  perfectKind,
  sharedMove,
  THREE_VOICES,
} from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

const PARAMS = z.strictObject({
  strict: z.boolean().default(false).describe('Similar motion is a fault whatever the third voice does.'),
})
type Params = z.infer<typeof PARAMS>

export const v3DirectRelaxed: Rule<ChordState, Params> = {
  id: 'v3-direct-relaxed',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: PARAMS,
  ...chordPairs<Params>((before, now, { params }) => {
    for (const pair of PAIRS) {
      const code = judge(before, now, pair, params)
      if (code !== null) return breachAt(code, [before, now], {}, pair)
    }
    return null
  }),
  explain: {
    title: 'Similar motion into a fifth or octave',
    statement:
      'Two voices may move the same way into a fifth or octave if the third voice moves otherwise, or stays; into a unison never.',
    why: 'The third voice draws the ear away. When it runs along, or when the two end on one note, nothing hides the parallels that the ear fills in.',
    mends: 'Let the third voice move against the other two.',
    sources: cite('SOTON', 'BRIDGE ch.6', 'LEHM XI', 'FUX°', 'EX'),
    disagreement:
      'One school book stays as strict as in two voices; Fux writes such motion in nearly every example.',
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('F4 C5 C#5 D5', 'D4 A4 G4 A4', [2]),
    messages: {
      together: 'Two voices move the same way into a fifth or octave, and the third goes with them.',
      strict: 'Two voices move the same way into a fifth or octave.',
      unison: 'Two voices move the same way into a unison.',
    },
  },
}

function judge(before: Chord, now: Chord, pair: Pair, { strict }: Params): string | null {
  const interval = pairInterval(now, pair)
  const kind = perfectKind(interval)
  if (kind === null || kind === perfectKind(pairInterval(before, pair))) return null
  const move = sharedMove(before, now, pair)
  if (move === 0) return null
  if (interval.steps === 0) return 'unison'
  if (strict) return 'strict'
  const third = [0, 1, 2].find((voice) => voice !== pair[0] && voice !== pair[1]) as 0 | 1 | 2
  return moveOf(before, now, third) === move ? 'together' : null
}
