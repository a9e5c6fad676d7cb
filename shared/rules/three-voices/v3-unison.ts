import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { isSamePitch } from '@/shared/theory/pitch'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, PAIRS, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3Unison: Rule<Exercise, NoParams> = {
  id: 'v3-unison',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now) => {
    if (now.isFirst || now.isLast) return null
    const pair = PAIRS.find(([a, b]) => isSamePitch(now.voices[a], now.voices[b]))
    return pair === undefined ? null : breachAt('unison', [now], {}, pair)
  }),
  explain: {
    title: 'Unisons at the ends alone',
    statement: 'Two voices meet in a unison only in the first and last chord.',
    why: 'Where two voices become one, the three are only two.',
    mends: 'Let one of them take another note of the chord.',
    sources: cite('BRIDGE', 'CHER'),
    disagreement: 'Two school books let unisons pass on weak beats from second species on.',
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 F4 C#5 D5', RIGHT_SECOND, [2]),
    messages: {
      unison: 'Two voices meet in a unison inside the exercise.',
    },
  },
}
