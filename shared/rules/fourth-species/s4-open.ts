import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { judgeOpening, openingList } from '@/shared/rules/first-species/opening'
import { sonorityOf } from '@/shared/rules/first-species/sonority'
import { breachAt, goOn } from '@/shared/rules/fold'
import { FOURTH_SPECIES } from '@/shared/rules/fourth-species/folds'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { isImperfectConsonance } from '@/shared/theory/interval'
import { HALF_TICKS } from '@/shared/theory/duration'

const PARAMS = z.strictObject({
  rest: z.enum(['required', 'optional']).default('required').describe('A half rest before the first note.'),
  above: openingList(['unison', 'fifth', 'octave'], 'First intervals above the cantus.'),
  below: openingList(['unison', 'octave'], 'First intervals below the cantus.'),
  imperfect: z.boolean().default(false).describe('A third or a sixth may begin as well.'),
})
type Params = z.infer<typeof PARAMS>

/** `waiting` until the first note has sounded. */
type State = Readonly<{ exercise: Exercise; isWaiting: boolean }>

const example = exampleIn(4, 'D4 F4 E4 D4')

export const s4Open: Rule<State, Params> = {
  id: 's4-open',
  level: 'law',
  scope: 'pair',
  species: FOURTH_SPECIES,
  params: PARAMS,
  start: (exercise) => ({ exercise, isWaiting: true }),
  step: (state, moment, params) => {
    const { exercise, isWaiting } = state
    if (!isWaiting) return goOn(state)
    const begun = { exercise, isWaiting: false }
    if (moment.note === 'rest') {
      const isHalf = moment.isFirst && moment.ticks === HALF_TICKS
      return isHalf ? goOn(state) : { state: begun, breach: breachAt('line', 'not-half-rest', [moment]) }
    }
    const now = sonorityOf(moment)
    if (now === null) return goOn(begun)
    if (moment.isFirst && params.rest === 'required') {
      return { state: begun, breach: breachAt('line', 'no-rest', [moment]) }
    }
    const simple = { steps: now.simpleSteps, semitones: now.simpleSemitones }
    if (params.imperfect && isImperfectConsonance(simple)) return goOn(begun)
    const allowed = exercise.position === 'above' ? params.above : params.below
    return { state: begun, breach: judgeOpening(now, allowed, []) }
  },
  finish: () => null,
  key: ({ isWaiting }) => (isWaiting ? 1 : 0),
  explain: {
    title: 'Begin after a half rest',
    statement:
      'The line begins after a half rest: above the cantus with a unison, fifth or octave, below with a unison or octave.',
    why: 'The rest sets the line half a bar behind the cantus, where it stays. The first interval says the mode, as in first species.',
    mends: 'Begin with a half rest and the final, or above the cantus its fifth.',
    sources: cite('OMT1', 'GROVE', 'MT21C', 'LIST', 'LEHM VI', 'EX'),
    disagreement:
      'One textbook allows only the octave above; one school book lets a third or a sixth begin, as the entry is off the beat.',
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('r:2,F4:2~ F4:2,D5:2~ D5:2,C#5:2 D5', [1]),
    messages: {
      'no-rest': 'The line begins on the beat, not after a half rest.',
      'not-half-rest': 'The rest at the beginning is not a half rest.',
      'not-perfect': 'The voices begin a {interval} apart, which is no perfect consonance.',
      'not-allowed': 'The voices begin a {interval} apart, which this rule set does not begin with.',
    },
  },
}
