import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3DiminishedTriad: Rule<Exercise, NoParams> = {
  id: 'v3-diminished-triad',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now) => {
    const [one, two] = now.overBass
    const has = (steps: number, semitones: number): boolean =>
      [one, two].some((interval) => interval.steps === steps && interval.semitones === semitones)
    if (has(4, 6) && has(2, 3)) return breachAt('root', [now])
    return has(3, 6) && has(5, 9) ? breachAt('fifth', [now]) : null
  }),
  explain: {
    title: 'Diminished triads stand on their third',
    statement: 'A diminished triad is used only with its third in the bass.',
    why: 'With its third below, both other notes agree with the bass; in any other order the tritone stands on it.',
    mends: 'Put the third of the chord into the bass, or change the chord.',
    sources: cite('BRIDGE ch.6', 'LEHM XI'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('G4 D5 F4 D5', 'B4 A4 D5 F5', [3], { cantus: 'E4 F4 B3 D4' }),
    messages: {
      root: 'A diminished triad stands on its root.',
      fifth: 'A diminished triad stands on its fifth.',
    },
  },
}
