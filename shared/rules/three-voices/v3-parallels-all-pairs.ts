import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import type { Rule } from '@/shared/rules/rule'
import {
  breachAt,
  chordPairs,
  type ChordState,
  pairInterval,
  PAIRS,
  perfectKind,
  sharedMove,
  THREE_VOICES,
} from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3ParallelsAllPairs: Rule<ChordState, NoParams> = {
  id: 'v3-parallels-all-pairs',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...chordPairs((before, now) => {
    for (const pair of PAIRS) {
      const kind = perfectKind(pairInterval(now, pair))
      if (kind === null || kind !== perfectKind(pairInterval(before, pair))) continue
      if (sharedMove(before, now, pair) !== 0)
        return breachAt(kind === 'fifth' ? 'fifths' : 'octaves', [before, now], {}, pair)
    }
    return null
  }),
  explain: {
    title: 'No parallels between any two voices',
    statement: 'No two of the three voices move in parallel fifths, octaves or unisons.',
    why: 'Each pair of voices is heard by itself as well. Two that move in octaves are one.',
    mends: 'Let one voice of the pair move the other way.',
    sources: cite('SOTON', 'OMT1', 'LEHM', 'EX'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 C5 C#5 D5', 'F4 A4 G4 F#4', [2]),
    messages: {
      fifths: 'Two of the voices move in parallel fifths.',
      octaves: 'Two of the voices move in parallel octaves or unisons.',
    },
  },
}
