import { cite } from '@/shared/rules/cite'
import { acrossBars, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, lowerOf, upperOf } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { comparePitches } from '@/shared/theory/pitch'

export const voiceOverlap: Rule<NeighbourState, NoParams> = {
  id: 'voice-overlap',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...acrossBars((before, now, { exercise: { position } }) => {
    if (comparePitches(upperOf(now, position), lowerOf(before, position)) < 0) {
      return breachAt('upper-below', [before, now])
    }
    return comparePitches(lowerOf(now, position), upperOf(before, position)) > 0
      ? breachAt('lower-above', [before, now])
      : null
  }),
  explain: {
    title: 'No overlap',
    statement: 'A voice does not move past the note that the other voice has just left.',
    why: 'The ear joins the note with the one it passes, and hears one voice leaping instead of two moving.',
    mends: 'Stay on this side of the note the other voice has left.',
    sources: cite('OMT1', 'RUSH I', 'DAVD', 'EX'),
    disagreement: 'A law in two textbooks of today; the sources of the eighteenth century do not know it.',
    right: {
      cantus: 'D4 A4 D4 F4 E4 D4',
      line: 'A4 C5 B4 A4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 A4 D4 F4 E4 D4',
      line: 'A4 C5 F4 A4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: {
      'upper-below': 'The upper voice moves below the note the lower voice has just left.',
      'lower-above': 'The lower voice moves above the note the upper voice has just left.',
    },
  },
}
