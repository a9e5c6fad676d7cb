import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES, isEighth, isOnQuarter } from '@/shared/rules/fifth-species/folds'
import { breachAt, sonorityOf } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  max: z.int().min(0).max(4).default(1).describe('Pairs of eighths in one bar.'),
})
type Params = z.infer<typeof PARAMS>

type State = Readonly<{ pairs: number }>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5EighthCount: Rule<State, Params> = {
  id: 's5-eighth-count',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => ({ pairs: 0 }),
  step: (state, moment, { max }) => {
    const earlier = moment.place === 0 ? 0 : state.pairs
    const now = sonorityOf(moment)
    if (now === null || !isEighth(now) || !isOnQuarter(now)) return goOn({ pairs: earlier })
    const pairs = earlier + 1
    return {
      state: { pairs },
      breach: pairs > max ? breachAt('too-many', [now], { count: max }, 'line') : null,
    }
  },
  finish: () => null,
  key: ({ pairs }) => pairs,
  explain: {
    title: 'One pair of eighths a bar',
    statement: 'A bar has at most one pair of eighths.',
    why: 'Eighths are the spice of the line. With more of them it starts to run.',
    mends: 'Turn one of the pairs into a quarter.',
    sources: cite('GIRT', 'CHER', 'E2-5', 'EX'),
    disagreement: 'Two sources tolerate two separate pairs in a bar. Fux never has more than one.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,B4:0.5,C5:0.5,D5:1,C5:0.5,B4:0.5 C5:2,C#5:2 D5', [2]),
    messages: { 'too-many': 'This bar has more pairs of eighths than {count}.' },
  },
}
