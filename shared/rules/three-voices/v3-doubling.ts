import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { formatPitchClass, type Pitch } from '@/shared/theory/pitch'
import { leadingToneOf } from '@/shared/theory/scale'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { breachAt, eachChord, THREE_VOICES } from '@/shared/rules/three-voices/chord'
import { RIGHT_LINE, RIGHT_SECOND, trio } from '@/shared/rules/three-voices/example-of-three'

export const v3Doubling: Rule<Exercise, NoParams> = {
  id: 'v3-doubling',
  level: 'preference',
  scope: 'trio',
  species: THREE_VOICES,
  params: NO_PARAMS,
  ...eachChord((now, { exercise }) => {
    const doubled = now.voices.find((pitch, place) =>
      now.voices.some((one, at) => at > place && isSameClass(one, pitch)),
    )
    if (doubled === undefined) return null
    const args = { note: formatPitchClass(doubled) }
    if (isLeadingTone(doubled, exercise)) return breachAt('leading-tone', [now], args)
    const [one, two] = now.overBass
    const isThird =
      isSameClass(now.middle, now.top) && one.steps === 2 && one.semitones === 4 && two.steps === 2
    return isThird ? breachAt('third', [now], args) : null
  }),
  explain: {
    title: 'What to double',
    statement: 'The root is doubled first; a major third and the leading tone are not doubled.',
    why: 'A doubled note is louder. The root bears that; a major third sticks out, and two leading tones would have to move in octaves.',
    mends: 'Double the root or the fifth of the chord.',
    sources: cite('BRIDGE ch.6', 'LEHM XI', 'CHER'),
    right: trio(RIGHT_LINE, RIGHT_SECOND),
    wrong: trio('A4 A4 C#5 D5', 'F4 A5 G4 A4', [2]),
    messages: {
      'leading-tone': 'The leading tone, {note}, is doubled.',
      third: 'The major third, {note}, is doubled.',
    },
  },
}

const isSameClass = (
  a: Pick<Pitch, 'letter' | 'alteration'>,
  b: Pick<Pitch, 'letter' | 'alteration'>,
): boolean => a.letter === b.letter && a.alteration === b.alteration

function isLeadingTone(pitch: Pitch, { mode, final }: Exercise): boolean {
  const leading = leadingToneOf(mode, final)
  return leading !== null && isSameClass(leading, pitch)
}
