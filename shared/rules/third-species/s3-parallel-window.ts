import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import {
  breachAt,
  cantusMove,
  perfectKindOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { quarterOf, THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const quarters = (fallback: readonly number[], description: string) =>
  z
    .array(z.int().min(2).max(3))
    .default([...fallback])
    .describe(description)

const PARAMS = z.strictObject({
  fifths: quarters([3], 'Quarters that may not be a fifth before a fifth on the next downbeat.'),
  octaves: quarters([2, 3], 'Quarters that may not be an octave or unison before one on the next downbeat.'),
})
type Params = z.infer<typeof PARAMS>

/** The second and third quarter of this bar, where they are perfect consonances that a rule set minds. */
type State = Readonly<{ second: Sonority | null; third: Sonority | null }>
const NONE: State = { second: null, third: null }

const kindKey = (note: Sonority | null): number => {
  const kind = note && perfectKindOf(note)
  return kind === null ? 0 : kind === 'fifth' ? 1 : 2
}

/**
 * The first quarter is the matter of `s3-downbeat-perfects`, the fourth that of `s3-barline` and
 * `par-perfect-contrary`; here it is about those between.
 */
export const s3ParallelWindow: Rule<State, Params> = {
  id: 's3-parallel-window',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, params) => {
    const now = sonorityOf(moment)
    if (moment.place === 0) return { state: NONE, breach: now && judge(state, now) }
    if (now === null) return goOn(state)
    const kind = perfectKindOf(now)
    const quarter = quarterOf(now)
    const minded = kind === 'fifth' ? params.fifths : kind === 'octave' ? params.octaves : []
    if (!minded.includes(quarter)) return goOn(state)
    return goOn(quarter === 2 ? { ...state, second: now } : { ...state, third: now })
  },
  finish: () => null,
  key: ({ second, third }) => pack([kindKey(second), 3], [kindKey(third), 3]),
  explain: {
    title: 'Perfect consonances kept apart',
    statement:
      'A fifth on a downbeat is not preceded by a fifth on the third or fourth quarter before it, nor an octave or unison by one on the second, third or fourth.',
    why: 'A note or two between them does not hide two equal perfect consonances in a row.',
    mends: 'Put another interval on the earlier quarter, or a third or sixth on the downbeat.',
    sources: cite('OMT1', 'DAVID', 'GROVE 3rd order', 'FLASH', 'LEHM IV', 'EX'),
    disagreement:
      'Five sources draw five windows, from the last quarter alone to a whole bar. Fux keeps the one of the open textbook everywhere.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,C5:1,A4:1 B4:1,G4:1,B4:1,C#5:1 D5', [3]),
    messages: {
      fifths: 'The downbeat is a fifth, too soon after the fifth on quarter {quarter} of the bar before.',
      octaves:
        'The downbeat is an octave or unison, too soon after the one on quarter {quarter} of the bar before.',
    },
  },
}

function judge({ second, third }: State, now: Sonority): Breach | null {
  const kind = perfectKindOf(now)
  if (kind === null) return null
  for (const earlier of [third, second]) {
    if (earlier === null || perfectKindOf(earlier) !== kind || cantusMove(earlier, now) === 0) continue
    return breachAt(kind === 'fifth' ? 'fifths' : 'octaves', [earlier, now], { quarter: quarterOf(earlier) })
  }
  return null
}
