import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, ACCENTED_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import {
  perfectRuns,
  RUN_PARAMS,
  type RunParams,
  type RunState,
} from '@/shared/rules/third-species/perfect-runs'
import { HALF_TICKS } from '@/shared/theory/duration'

export const s3Beat3Perfects: Rule<RunState, RunParams> = {
  id: 's3-beat3-perfects',
  level: 'preference',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: RUN_PARAMS,
  ...perfectRuns(HALF_TICKS),
  explain: {
    title: 'Equal perfects on the third quarters',
    statement: 'The third quarters of two bars in a row are not both fifths, nor both octaves or unisons.',
    why: 'The third quarter is the second strongest place of the bar, and what stands there is compared.',
    mends: 'Put a third or a sixth on one of the two.',
    sources: cite('GROVE', 'EX'),
    disagreement: 'Only one source forbids it, and Fux does it in two figures.',
    right: shortExample(ACCENTED_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [3]),
    messages: {
      fifths: 'The third quarters of {count} bars in a row are fifths.',
      octaves: 'The third quarters of {count} bars in a row are octaves or unisons.',
    },
  },
}
