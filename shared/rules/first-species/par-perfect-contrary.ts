import { cite } from '@/shared/rules/cite'
import { neighbours, NO_PARAMS, type NeighbourState, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, isContrary, perfectKindOf } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

export const parPerfectContrary: Rule<NeighbourState, NoParams> = {
  id: 'par-perfect-contrary',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: NO_PARAMS,
  ...neighbours((before, now) => {
    const kind = perfectKindOf(now)
    if (kind === null || kind !== perfectKindOf(before) || !isContrary(before, now)) return null
    return breachAt(kind === 'fifth' ? 'fifths' : 'octaves', [before, now])
  }),
  explain: {
    title: 'No fifths or octaves by contrary motion',
    statement:
      'A fifth is not followed by a twelfth, nor a unison by an octave, even when the voices move against each other.',
    why: 'The ear hears the same empty sonority twice; the octave between them hides little.',
    mends: 'Put a third or a sixth between the two.',
    sources: cite('OMT1', 'LEHM I', 'DAVD', 'HSR soft 4'),
    disagreement: 'One teacher, as reported in a handout, allows it.',
    right: { cantus: 'D4 A4 F4 E4 D4', line: 'D5 C5 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 A4 F4 E4 D4', line: 'A5 E5 D5 C#5 D5', mode: 'dorian', final: 'D', breaches: [2] },
    messages: {
      fifths: 'A fifth follows a fifth, the voices moving against each other.',
      octaves: 'An octave follows an octave or unison, the voices moving against each other.',
    },
  },
}
