import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { STRUCK_SPECIES } from '@/shared/rules/first-species/folds'
import { breachAt, perfectKindOf, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  maxPerfectPercent: z
    .int()
    .min(0)
    .max(100)
    .default(50)
    .describe('Share of the inner bars that may be fifths or octaves. No source gives a number.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{ inner: number; perfects: readonly Sonority[] }>

export const imperfectPreferred: Rule<State, Params> = {
  id: 'imperfect-preferred',
  level: 'preference',
  scope: 'pair',
  species: STRUCK_SPECIES,
  params: PARAMS,
  start: () => ({ inner: 0, perfects: [] }),
  step: (state, moment) => {
    const now = sonorityOf(moment)
    if (now === null || moment.place !== 0 || moment.isFirst || moment.isLast) return goOn(state)
    const isPerfect = perfectKindOf(now) !== null
    return goOn({
      inner: state.inner + 1,
      perfects: isPerfect ? [...state.perfects, now] : state.perfects,
    })
  },
  finish: ({ inner, perfects }, { maxPerfectPercent }, isComplete) =>
    isComplete && 100 * perfects.length > maxPerfectPercent * inner
      ? breachAt('too-many', perfects, { count: perfects.length, of: inner })
      : null,
  key: ({ inner, perfects }) => pack([inner, 256], [perfects.length, 256]),
  explain: {
    title: 'Rather thirds and sixths',
    statement: 'Inside the exercise thirds and sixths are preferred to fifths and octaves.',
    why: 'Thirds and sixths are full and move easily; fifths and octaves are hollow and stand still.',
    mends: 'Change some fifths and octaves inside to thirds or sixths.',
    sources: cite('FUXE r3', 'OMT1', 'LEHM I', 'HSR hard 1'),
    right: {
      cantus: 'D4 G4 F4 A4 G4 E4 D4',
      line: 'D5 B4 A4 C5 E5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 G4 F4 A4 G4 E4 D4',
      line: 'D5 D5 F5 E5 E5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [4],
    },
    messages: { 'too-many': 'Fifths and octaves fill {count} of {of} inner bars.' },
  },
}
