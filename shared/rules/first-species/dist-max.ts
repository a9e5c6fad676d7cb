import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, sizeOf, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES, asRemark, goOn } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { nameSize } from '@/shared/theory/interval-name'

const PARAMS = z.strictObject({
  max: z.int().min(3).max(22).default(12).describe('The widest interval allowed: 12 for a twelfth.'),
  preferred: z
    .int()
    .min(3)
    .max(22)
    .default(22)
    .describe('An interval that is passed only briefly; longer is told as a remark.'),
  beyondPreferred: z
    .int()
    .min(0)
    .max(12)
    .default(2)
    .describe('Notes in a row that may pass the preferred interval.'),
})
type Params = z.infer<typeof PARAMS>

/** The sonorities in a row that are wider than preferred; one more than the limit is kept at most. */
type State = Readonly<{ wide: readonly Sonority[] }>
const NONE: State = { wide: [] }

export const distMax: Rule<State, Params> = {
  id: 'dist-max',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  start: () => NONE,
  step: (state, moment, { max, preferred, beyondPreferred }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn(NONE)
    const isWide = now.steps + 1 > preferred
    const wide = isWide ? [...(beyondPreferred === 0 ? [] : state.wide.slice(-beyondPreferred)), now] : []
    const next = isWide ? { wide } : NONE
    if (now.steps + 1 > max) {
      return {
        state: next,
        breach: breachAt('too-far', [now], { interval: sizeOf(now), max: nameSize(max - 1) }),
      }
    }
    if (wide.length <= beyondPreferred) return goOn(next)
    const args = { interval: sizeOf(now), preferred: nameSize(preferred - 1) }
    return { state: next, breach: asRemark(breachAt('far', wide, args)) }
  },
  finish: () => null,
  key: ({ wide }) => wide.length,
  explain: {
    title: 'Within reach of each other',
    statement: 'The voices stay within reach of each other: a twelfth apart at the most, and mostly nearer.',
    why: 'Voices far apart no longer seem to speak together.',
    mends: 'Bring the line back towards the cantus.',
    sources: cite('OMT1', 'ECR C4', 'JEPP°', 'EX'),
    disagreement:
      'A twelfth in some sources, a tenth in others; one would rather stay within an octave. Fux once goes to a thirteenth.',
    right: {
      cantus: 'D4 C4 D4 F4 E4 D4',
      line: 'D5 E5 F5 D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 C4 D4 F4 E4 D4',
      line: 'D5 A5 F5 D5 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [2],
    },
    messages: {
      'too-far': 'The voices are a {interval} apart, further than a {max}.',
      far: 'The voices have been further apart than a {preferred} for some time.',
    },
  },
}
