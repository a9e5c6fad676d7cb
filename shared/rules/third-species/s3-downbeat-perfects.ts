import { cite } from '@/shared/rules/cite'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import {
  perfectRuns,
  RUN_PARAMS,
  type RunParams,
  type RunState,
} from '@/shared/rules/third-species/perfect-runs'

export const s3DownbeatPerfects: Rule<RunState, RunParams> = {
  id: 's3-downbeat-perfects',
  level: 'preference',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: RUN_PARAMS,
  ...perfectRuns(0),
  explain: {
    title: 'Equal perfects from downbeat to downbeat',
    statement: 'Two bars in a row do not begin with fifths, nor with octaves or unisons.',
    why: 'The ear joins the strong beats, and hears the parallels between them through all that lies between.',
    mends: 'Begin one of the bars with a third or a sixth.',
    sources: cite('OMT1', 'DAVID', 'GROVE', 'LEHM', 'FLASH', 'EX'),
    disagreement: 'One textbook allows two in a row; the others none. Fux has octaves twice.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 C5:1,B4:1,A4:1,G4:1 B4:1,G4:1,B4:1,C#5:1 D5', [3]),
    messages: {
      fifths: 'The first quarters of {count} bars in a row are fifths.',
      octaves: 'The first quarters of {count} bars in a row are octaves or unisons.',
    },
  },
}
