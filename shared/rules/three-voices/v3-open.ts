import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { degreeOf } from '@/shared/theory/scale'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3Open: Rule<Exercise, NoParams> = {
  id: 'v3-open',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now, { exercise }) => {
    if (!now.isFirst) return null
    if (degreeOf(now.bass, exercise.final) !== 1) return breachAt('bass', [now])
    const isOfTriad = now.overBass.every(({ steps }) => steps === 0 || steps === 2 || steps === 4)
    return isOfTriad ? null : breachAt('foreign', [now])
  }),
  explain: {
    title: 'Open on the triad of the final',
    statement:
      'The first chord is the triad of the final, whole or without one of its notes, with the final in the bass.',
    why: 'The first chord says the mode.',
    mends: 'Begin with the final below, and its third, fifth or octave above.',
    sources: cite('BRIDGE ch.6', 'LEHM XI', 'EX'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('B4 C5 C#5 D5', RIGHT_SECOND, [1]),
    messages: {
      bass: 'The first chord does not have the final in its bass.',
      foreign: 'The first chord has a note that is not of the triad of the final.',
    },
  },
}
