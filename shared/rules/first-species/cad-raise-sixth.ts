import { cite } from '@/shared/rules/cite'
import { neighbours, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, degreeIn, lineMove, lineSpan } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { chromaticNumber, formatPitch } from '@/shared/theory/pitch'
import { isLeadingTone } from '@/shared/theory/scale'

export const cadRaiseSixth: Rule<NeighbourState, NoParams> = {
  id: 'cad-raise-sixth',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...neighbours((before, now, { exercise, moment }) => {
    if (!moment.isPenultimate || !isLeadingTone(now.note, exercise.mode, exercise.final)) return null
    const isClimb =
      degreeIn(before.note, exercise) === 6 && lineSpan(before, now) === 1 && lineMove(before, now) === 1
    if (!isClimb || chromaticNumber(now.note) - chromaticNumber(before.note) <= 2) return null
    return breachAt('not-raised', [before, now], { note: formatPitch(before.note) }, 'line')
  }),
  explain: {
    title: 'Raise the sixth on the way up',
    statement:
      'Where the line climbs 6–7–8 into the close and the seventh is raised, the sixth is raised too.',
    why: 'From a low sixth to a raised seventh is an augmented second, which does not sing.',
    mends: 'Raise the sixth degree as well, or come to the leading tone from elsewhere.',
    sources: cite('SOLON', 'DAVD', 'OMT1', 'LEHM II', 'EX Fig 42'),
    right: { cantus: 'A3 C4 A3 B3 A3', line: 'A4 G4 F#4 G#4 A4', mode: 'aeolian', final: 'A', breaches: [] },
    wrong: { cantus: 'A3 C4 A3 B3 A3', line: 'A4 G4 F4 G#4 A4', mode: 'aeolian', final: 'A', breaches: [4] },
    messages: { 'not-raised': 'The line climbs from {note} to the raised seventh by an augmented second.' },
  },
}
