import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { BARE_SPECIES, neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import { judgeSimilarMotion, similarMotionParam } from '@/shared/rules/first-species/perfect-entry'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  exceptions: similarMotionParam,
})
type Params = z.infer<typeof PARAMS>

/** Two perfect consonances of one kind in a row are the matter of `par-perfect`. */
export const dirPerfect: Rule<NeighbourState, Params> = {
  id: 'dir-perfect',
  level: 'law',
  scope: 'pair',
  species: BARE_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { exercise, params }) =>
    judgeSimilarMotion(before, now, exercise, params.exceptions),
  ),
  explain: {
    title: 'No similar motion into a fifth or octave',
    statement: 'A fifth, an octave or a unison is not entered by both voices moving the same way.',
    why: 'When both voices run into a perfect consonance the ear fills in the notes between and hears parallel fifths or octaves.',
    mends: 'Come to it from the other side, or let one voice stay.',
    sources: cite(
      'FUXE r1',
      'FUXN',
      'OMT1',
      'RUSH I',
      'LOEFF r3',
      'DAVD',
      'BRIDGE',
      'LEHM',
      'NOTAV I-iii',
      'HSR',
      'EX',
    ),
    disagreement:
      'Many sources allow no exception. Others let it pass when the upper voice steps, when either voice steps, when the upper voice rises a semitone to the octave, or between tonic and dominant.',
    right: {
      cantus: 'D4 E4 F4 G4 E4 D4',
      line: 'A4 C5 C5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 E4 F4 G4 E4 D4',
      line: 'A4 G4 C5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: {
      'rise-into': 'Both voices rise into a {interval}.',
      'rise-into.mend': 'Come to it from above, or let one voice stay.',
      'fall-into': 'Both voices fall into a {interval}.',
      'fall-into.mend': 'Come to it from below, or let one voice stay.',
    },
  },
}
