import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, foldNotes, type Frame } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

export const s2OpenRest: Rule<Frame, NoParams> = {
  id: 's2-open-rest',
  level: 'preference',
  scope: 'line',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...foldNotes<NoParams>((now) =>
    now.isFirst && now.place === 0 ? breachAt('line', 'no-rest', [now]) : null,
  ),
  explain: {
    title: 'Begin with a half rest',
    statement: 'The line begins with a half rest.',
    why: 'Entering after the cantus, the line is heard at once as a voice of its own.',
    mends: 'Put a half rest in the place of the first note.',
    sources: cite('OMT1', 'CHER r14', 'BRIDGE', 'LEHM', 'NOTAV II-iii', 'GROVE', 'FUXN', 'EX'),
    disagreement:
      'Two sources require the rest, four prefer it, two leave it free. Eleven of Fux’s twelve examples have it.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D5:2,A4:2 D5:2,A4:2 B4:2,C#5:2 D5', [1]),
    messages: { 'no-rest': 'The line begins on the beat, without a half rest.' },
  },
}
