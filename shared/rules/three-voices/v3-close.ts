import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { isFinal } from '@/shared/theory/scale'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, perfectKind, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3Close: Rule<Exercise, NoParams> = {
  id: 'v3-close',
  level: 'law',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now, { exercise }) => {
    if (!now.isLast) return null
    if (!isFinal(now.bass, exercise.final)) return breachAt('bass', [now])
    const isMinor = now.overBass.some(({ steps, semitones }) => steps === 2 && semitones === 3)
    if (isMinor) return breachAt('minor', [now])
    const isFirm = now.overBass.every((interval) => perfectKind(interval) !== null || interval.steps === 2)
    return isFirm ? null : breachAt('foreign', [now])
  }),
  explain: {
    title: 'Close on the final',
    statement:
      'The last chord stands on the final, with its fifth or octave; if it has a third, the third is major.',
    why: 'The end should be as firm as three voices can make it. A minor third sounds unfinished there, so it is raised or left out.',
    mends: 'End with the final in the bass and its fifth, octave or major third above.',
    sources: cite('GROVE', 'EX'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 C5 C#5 D5', 'F4 A4 G4 F4', [4]),
    messages: {
      bass: 'The last chord does not stand on the final.',
      minor: 'The last chord has a minor third.',
      foreign: 'The last chord has a note that is neither third, fifth nor octave.',
    },
  },
}
