import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import { isSuspension, TIED_SPECIES } from '@/shared/rules/fourth-species/folds'
import { suspensionOf, SUSPENSIONS_ABOVE, SUSPENSIONS_BELOW } from '@/shared/rules/fourth-species/suspension'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  max: z.int().min(1).max(12).default(3).describe('Equal suspensions in a row.'),
})
type Params = z.infer<typeof PARAMS>

/** The equal suspensions that have just followed each other, at most one more than the limit. */
type State = Readonly<{ run: readonly Sonority[] }>
const NONE: State = { run: [] }
const NAMES: readonly string[] = [...SUSPENSIONS_ABOVE, ...SUSPENSIONS_BELOW]

const example = exampleIn(4, 'D4 B4 A4 G4 F4 E4 D4')

export const s4ChainLimit: Rule<State, Params> = {
  id: 's4-chain-limit',
  level: 'preference',
  scope: 'pair',
  species: TIED_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { max }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    if (now.place !== 0) return goOn(state)
    const figure = isSuspension(now) ? suspensionOf(now) : null
    if (figure === null) return goOn(NONE)
    const before = state.run.at(-1)
    const goesOn = before !== undefined && suspensionOf(before) === figure
    const run = goesOn ? [...state.run.slice(-max), now] : [now]
    const args = { count: run.length, figure: figure.replace('-', '–') }
    return { state: { run }, breach: run.length > max ? breachAt('too-many', run, args) : null }
  },
  finish: () => null,
  key: ({ run }) => {
    const last = run.at(-1)
    return pack([run.length, 16], [last === undefined ? 0 : NAMES.indexOf(suspensionOf(last) ?? '') + 1, 16])
  },
  explain: {
    title: 'Not too long a chain',
    statement: 'Equal suspensions follow each other only a few times: three 7–6, three 4–3, three 2–3.',
    why: 'A chain carries the line down beautifully, and after a while by itself; then the ear stops listening.',
    mends: 'Break the chain with another suspension, or with a consonant tie that leaps.',
    sources: cite('OMT1', 'EX'),
    disagreement: 'One textbook sets the limit of three. Fux has four in a row in fifth species.',
    right: example('r:2,D5:2~ D5:2,G5:2~ G5:2,F5:2~ F5:2,E5:2~ E5:2,D5:2~ D5:2,C#5:2 D5', [], {
      params: { max: 5 },
    }),
    wrong: example('r:2,A5:2~ A5:2,G5:2~ G5:2,F5:2~ F5:2,E5:2~ E5:2,D5:2~ D5:2,C#5:2 D5', [5, 6]),
    messages: { 'too-many': 'This makes {count} suspensions {figure} in a row.' },
  },
}
