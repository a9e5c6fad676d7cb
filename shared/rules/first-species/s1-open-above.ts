import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { OPENED_AS_FIRST } from '@/shared/rules/first-species/folds'
import { judgeOpening, openingList, openings, type OpeningState } from '@/shared/rules/first-species/opening'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  set: openingList(['unison', 'fifth', 'octave'], 'Intervals to open with; twelfths count as fifths.'),
  secondBest: openingList([], 'Intervals that are tolerated with a remark.'),
})
type Params = z.infer<typeof PARAMS>

export const s1OpenAbove: Rule<OpeningState, Params> = {
  id: 's1-open-above',
  level: 'law',
  scope: 'pair',
  species: OPENED_AS_FIRST,
  params: PARAMS,
  ...openings<Params>((now, { exercise, params }) =>
    exercise.position === 'above' ? judgeOpening(now, params.set, params.secondBest) : null,
  ),
  explain: {
    title: 'Opening above',
    statement: 'A line above the cantus opens on a perfect consonance: the unison, the fifth or the octave.',
    why: 'The first sonority shows the mode. A perfect consonance over the final shows it at once; a third or sixth leaves it open.',
    mends: 'Begin a fifth or an octave above the cantus.',
    sources: cite('OMT1', 'BRIDGE ch.1', 'LEHM', 'NOTAV', 'GIRT', 'MT21C', 'CHER r1', 'FUXE b'),
    disagreement:
      'Most sources allow the unison, the fifth and the octave. One calls the unison second best, one leaves out the fifth, and one lists the twelfth by name.',
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'F4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [1] },
    messages: {
      'not-perfect': 'The line opens on a {interval}, not on a perfect consonance.',
      'not-allowed': 'The line opens on a {interval}, which these rules do not allow.',
      'not-allowed.mend': 'Open on one of these: {allowed}.',
      'second-best': 'The line opens on a {interval}; another opening would be better.',
      'second-best.mend': 'Better: {allowed}.',
    },
  },
}
