import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn } from '@/shared/rules/fold'
import type { Moment, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { quarterOf, THIRD_SPECIES } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  begin: z
    .enum(['on-beat', 'after-rest', 'either'])
    .default('either')
    .describe('Where the line begins: on the beat, after a rest, or either.'),
  entries: z
    .array(z.int().min(2).max(4))
    .default([2])
    .describe('Quarters on which a line may enter after a rest: 2 after a quarter rest.'),
})
type Params = z.infer<typeof PARAMS>

/** `isWaiting` until the first note has sounded. */
type State = Readonly<{ isWaiting: boolean }>

/** The interval is the matter of `s1-open-above` and `s1-open-below`, which hold here as well. */
export const s3Open: Rule<State, Params> = {
  id: 's3-open',
  level: 'preference',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  start: () => ({ isWaiting: true }),
  step: (state, moment, params) => {
    if (!state.isWaiting || moment.note === 'rest') return goOn(state)
    const code = moment.note === null ? null : judge(moment, params)
    return {
      state: { isWaiting: false },
      breach: code === null ? null : breachAt('line', code, [moment], { quarter: quarterOf(moment) }),
    }
  },
  finish: () => null,
  key: ({ isWaiting }) => (isWaiting ? 1 : 0),
  explain: {
    title: 'The entry',
    statement: 'The line begins on the beat, or after a quarter rest.',
    why: 'Entering on the beat the line joins the cantus; entering after it, it is heard as a voice of its own.',
    mends: 'Begin on the first quarter, or on the second after a rest.',
    sources: cite('OMT1', 'LEHM IV', 'SOLON', 'MT21C', 'FLASH', 'EX'),
    disagreement:
      'Two sources know no rest, and all of Fux’s six examples begin on the beat; one school finds a rest usual, before the second or the fourth quarter.',
    right: shortExample(SHORT_LINE, [], { params: { begin: 'on-beat' } }),
    wrong: shortExample('r:1,D4:1,E4:1,F4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [1], {
      params: { begin: 'on-beat' },
    }),
    messages: {
      rests: 'The line rests before it begins.',
      'rests.mend': 'Begin on the first quarter.',
      'no-rest': 'The line begins on the beat, without a rest.',
      'no-rest.mend': 'Put a quarter rest in the place of the first note.',
      late: 'The line enters on quarter {quarter}.',
    },
  },
}

function judge(moment: Moment, { begin, entries }: Params): string | null {
  const quarter = quarterOf(moment)
  if (quarter === 1 && moment.isFirst) return begin === 'after-rest' ? 'no-rest' : null
  if (begin === 'on-beat') return 'rests'
  return moment.place > 0 && entries.includes(quarter) ? null : 'late'
}
