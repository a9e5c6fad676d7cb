import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { STRUCK_SPECIES } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  isSixth,
  isThird,
  perfectKindOf,
  sonorityOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  maxPercentOfOne: z
    .int()
    .min(1)
    .max(100)
    .default(80)
    .describe('Share of the inner bars that one interval may fill. No source gives a number.'),
})
type Params = z.infer<typeof PARAMS>

/** Kinds that are counted apart; octaves added make no difference. */
const KINDS = ['thirds', 'sixths', 'fifths', 'octaves'] as const

/** The inner sonorities of each kind, in the order of `KINDS`. */
type State = Readonly<{ inner: number; found: readonly (readonly Sonority[])[] }>

/** Below this many inner bars there is no room for variety. */
const FEWEST_INNER_BARS = 3

export const intervalVariety: Rule<State, Params> = {
  id: 'interval-variety',
  level: 'preference',
  scope: 'pair',
  species: STRUCK_SPECIES,
  params: PARAMS,
  start: () => ({ inner: 0, found: KINDS.map(() => []) }),
  step: (state, moment) => {
    const now = sonorityOf(moment)
    if (now === null || moment.place !== 0 || moment.isFirst || moment.isLast) return goOn(state)
    const kind = kindOf(now)
    return goOn({
      inner: state.inner + 1,
      found: state.found.map((sonorities, index) => (index === kind ? [...sonorities, now] : sonorities)),
    })
  },
  finish: ({ inner, found }, { maxPercentOfOne }, isComplete) => {
    if (!isComplete || inner < FEWEST_INNER_BARS) return null
    const kind = found.findIndex((sonorities) => 100 * sonorities.length > maxPercentOfOne * inner)
    if (kind < 0) return null
    const sonorities = found[kind] as readonly Sonority[]
    return breachAt('mostly', sonorities, {
      count: sonorities.length,
      of: inner,
      kind: KINDS[kind] as string,
    })
  },
  key: ({ inner, found }) =>
    pack([inner, 128], ...found.map((sonorities) => [sonorities.length, 128] as const)),
  explain: {
    title: 'Variety of intervals',
    statement: 'The line uses a variety of intervals against the cantus.',
    why: 'One interval all along grows dull, even a sweet one.',
    mends: 'Trade some of them for other consonances.',
    sources: cite('OMT1', 'DAVD', 'FUX°'),
    right: {
      cantus: 'C4 E4 F4 G4 A4 G4 D4 C4',
      line: 'G4 G4 D5 B4 C5 E5 B4 C5',
      mode: 'ionian',
      final: 'C',
      breaches: [],
    },
    wrong: {
      cantus: 'C4 E4 F4 G4 A4 G4 D4 C4',
      line: 'G4 G4 A4 B4 C5 B4 B4 C5',
      mode: 'ionian',
      final: 'C',
      breaches: [6],
    },
    messages: { mostly: '{kind} fill {count} of {of} inner bars.' },
  },
}

function kindOf(sonority: Sonority): number {
  if (isThird(sonority)) return 0
  if (isSixth(sonority)) return 1
  const perfect = perfectKindOf(sonority)
  if (perfect === null) return -1
  return perfect === 'fifth' ? 2 : 3
}
