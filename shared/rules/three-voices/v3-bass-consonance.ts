import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { isSixFour } from '@/shared/rules/three-voices/six-four'
import { isConsonant } from '@/shared/theory/interval'
import { nameInterval } from '@/shared/theory/interval-name'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3BassConsonance: Rule<Exercise, NoParams> = {
  id: 'v3-bass-consonance',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now) => {
    // A sixth with a fourth is the matter of `v3-six-four`.
    const wrong = isSixFour(now) ? undefined : now.overBass.find((interval) => !isConsonant(interval))
    return wrong === undefined ? null : breachAt('dissonant', [now], { interval: nameInterval(wrong) })
  }),
  explain: {
    title: 'Each voice agrees with the lowest',
    statement: 'Each upper voice is consonant with whichever voice is lowest.',
    why: 'The ear hears a chord from its bass. What agrees with the bass is at rest, whatever the upper voices make between them.',
    mends: 'Write a third, fifth, sixth or octave over the lowest voice.',
    sources: cite('SOTON', 'LEHM XI n.2', 'BRIDGE ch.6', 'EX'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 B4 C#5 D5', RIGHT_SECOND, [2]),
    messages: {
      dissonant: 'An upper voice makes a {interval} with the lowest.',
    },
  },
}
