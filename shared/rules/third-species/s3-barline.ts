import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { acrossBars, type NeighbourState } from '@/shared/rules/first-species/folds'
import { judgePerfectEntry, similarMotionParam } from '@/shared/rules/first-species/perfect-entry'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({ exceptions: similarMotionParam })
type Params = z.infer<typeof PARAMS>

/** Takes the place of `par-perfect` and `dir-perfect`. */
export const s3Barline: Rule<NeighbourState, Params> = {
  id: 's3-barline',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...acrossBars<Params>((before, now, { exercise, params }) =>
    judgePerfectEntry(before, now, exercise, params.exceptions),
  ),
  explain: {
    title: 'Over the bar line as in first species',
    statement:
      'From the fourth quarter to the next downbeat no fifths, octaves or unisons follow each other in parallel, and none is entered by both voices moving the same way.',
    why: 'These are the moments at which both voices move, just as in first species.',
    mends: 'Come to the fifth or octave from the other side, or put a third or a sixth there.',
    sources: cite('OMT1', 'MT21C', 'FLASH', 'EX'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,G4:1,A4:1,C5:1 B4:1,A4:1,B4:1,C#5:1 D5', [3]),
    messages: {
      fifths: 'Two fifths follow each other over the bar line.',
      octaves: 'Two octaves follow each other over the bar line.',
      unisons: 'Two unisons follow each other over the bar line.',
      'rise-into': 'Both voices rise over the bar line into a {interval}.',
      'rise-into.mend': 'Come to it from above, or go to a third or a sixth.',
      'fall-into': 'Both voices fall over the bar line into a {interval}.',
      'fall-into.mend': 'Come to it from below, or go to a third or a sixth.',
    },
  },
}
