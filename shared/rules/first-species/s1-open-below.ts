import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { OPENED_AS_FIRST } from '@/shared/rules/first-species/folds'
import { judgeOpening, openingList, openings, type OpeningState } from '@/shared/rules/first-species/opening'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  set: openingList(['unison', 'octave'], 'Intervals to open with; fifteenths count as octaves.'),
  secondBest: openingList([], 'Intervals that are tolerated with a remark.'),
})
type Params = z.infer<typeof PARAMS>

export const s1OpenBelow: Rule<OpeningState, Params> = {
  id: 's1-open-below',
  level: 'law',
  scope: 'pair',
  species: OPENED_AS_FIRST,
  params: PARAMS,
  ...openings<Params>((now, { exercise, params }) =>
    exercise.position === 'below' ? judgeOpening(now, params.set, params.secondBest) : null,
  ),
  explain: {
    title: 'Opening below',
    statement: 'A line below the cantus opens on the unison or the octave.',
    why: 'A fifth under the final would make another note sound like the final, and the mode would be misread.',
    mends: 'Begin on the final: with the cantus, or an octave under it.',
    sources: cite('OMT1', 'BRIDGE ch.1', 'NOTAV', 'FUXN', 'HSR soft 3', 'GIRT', 'LEHM I'),
    disagreement: 'One source also lists the fifth, without telling above from below.',
    right: {
      cantus: 'D4 F4 E4 D4',
      line: 'D4 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 E4 D4',
      line: 'G3 D4 C#4 D4',
      position: 'below',
      mode: 'dorian',
      final: 'D',
      breaches: [1],
    },
    messages: {
      'not-perfect': 'The line opens a {interval} below the cantus, not on the unison or the octave.',
      'not-allowed': 'The line opens a {interval} below the cantus, which hides the mode.',
      'second-best': 'The line opens on a {interval}; another opening would be better.',
      'second-best.mend': 'Better: {allowed}.',
    },
  },
}
