import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, foldPairs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import { formatPitch, isSamePitch } from '@/shared/theory/pitch'

export const s2Repeat: Rule<OneBehind, NoParams> = {
  id: 's2-repeat',
  level: 'law',
  scope: 'line',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  ...foldPairs<NoParams>((before, now) => {
    if (!isSamePitch(before.note, now.note)) return null
    const code = before.bar === now.bar ? 'in-bar' : 'over-barline'
    return breachAt('line', code, [before, now], { note: formatPitch(now.note) })
  }),
  explain: {
    title: 'No repeated notes',
    statement: 'A note is not repeated at once, neither inside the bar nor over the bar line.',
    why: 'Two equal halves make one whole note, and the second species is gone.',
    mends: 'Move one of the two notes.',
    sources: cite('LEHM II', 'GROVE', 'BRIDGE ch. 2', 'DAVD', 'EX'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 A4:2,D5:2 B4:2,C#5:2 D5', [2]),
    messages: {
      'in-bar': 'The line repeats its {note} inside the bar.',
      'over-barline': 'The line repeats its {note} over the bar line.',
    },
  },
}
