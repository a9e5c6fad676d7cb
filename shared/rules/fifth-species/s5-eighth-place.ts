import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES, isEighth, isOnQuarter } from '@/shared/rules/fifth-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'

import type { Rule } from '@/shared/rules/rule'
import { HALF_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  strong: z
    .enum(['no', 'beside-weak'])
    .default('no')
    .describe('Pairs on the first or third quarter: never, or only next to a pair on the second or fourth.'),
})
type Params = z.infer<typeof PARAMS>

/** Whether a pair is half sounded, the quarter before was a pair on a weak place, and a strong pair waits for one. */
type State = Readonly<{ isOpen: boolean; followsWeak: boolean; waiting: Sonority | null }>
const NONE: State = { isOpen: false, followsWeak: false, waiting: null }

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5EighthPlace: Rule<State, Params> = {
  id: 's5-eighth-place',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { strong }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    if (!isOnQuarter(now)) {
      const isPair = state.isOpen && isEighth(now)
      return {
        state: { ...state, isOpen: false },
        breach: isPair ? null : breachAt('alone', [now], {}, 'line'),
      }
    }
    const isPair = isEighth(now)
    const isStrong = now.place % HALF_TICKS === 0
    if (state.waiting !== null && !(isPair && !isStrong)) {
      const waiting = isPair && strong === 'beside-weak' ? now : null
      return {
        state: { isOpen: isPair, followsWeak: false, waiting },
        breach: breachAt('strong', [state.waiting], {}, 'line'),
      }
    }
    if (!isPair || !isStrong) return goOn({ isOpen: isPair, followsWeak: isPair, waiting: null })
    if (strong === 'no') {
      return { state: { ...NONE, isOpen: true }, breach: breachAt('strong', [now], {}, 'line') }
    }
    const isBeside = state.followsWeak && now.place > 0
    return goOn({ isOpen: true, followsWeak: false, waiting: isBeside ? null : now })
  },
  finish: () => null,
  key: ({ isOpen, followsWeak, waiting }) =>
    (isOpen ? 1 : 0) + (followsWeak ? 2 : 0) + (waiting === null ? 0 : 4),
  explain: {
    title: 'Eighths come in pairs, off the beat',
    statement: 'Eighth notes come in pairs on the second or the fourth quarter of the bar.',
    why: 'A pair of eighths is an ornament. On a strong quarter it would carry weight that such short notes cannot bear.',
    mends: 'Move the pair to the second or fourth quarter.',
    sources: cite('GIRT', 'LEHM IX', 'CHER 5th r1', 'NOTAV V', 'EX'),
    disagreement: 'One set of rules lets eighths stand on a strong quarter next to others on a weak one.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:2,D5:0.5,C5:0.5,D5:1~ D5:2,C#5:2 D5', [2]),
    messages: {
      strong: 'A pair of eighths stands on a strong quarter.',
      alone: 'An eighth stands alone, not in a pair.',
    },
  },
}
