import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import type { Rule } from '@/shared/rules/rule'
import {
  breachAt,
  chordPairs,
  type ChordState,
  moveOf,
  THREE_VOICES,
} from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3AllSameDirection: Rule<ChordState, NoParams> = {
  id: 'v3-all-same-direction',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...chordPairs((before, now) => {
    const move = moveOf(before, now, 0)
    const isTogether = move !== 0 && move === moveOf(before, now, 1) && move === moveOf(before, now, 2)
    return isTogether ? breachAt(move > 0 ? 'rise' : 'fall', [before, now]) : null
  }),
  explain: {
    title: 'Not all three the same way',
    statement: 'The three voices do not all move in the same direction.',
    why: 'Three voices that rise together are a block; counterpoint begins where one of them goes its own way.',
    mends: 'Let one voice stay, or move against the others.',
    sources: cite('SOTON', 'BRIDGE ch.6'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 C5 C#5 D5', 'F4 A4 G4 F#4', [2]),
    messages: {
      rise: 'All three voices rise together.',
      fall: 'All three voices fall together.',
    },
  },
}
