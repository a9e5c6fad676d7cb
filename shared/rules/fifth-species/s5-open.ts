import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES } from '@/shared/rules/fifth-species/folds'
import { openingList } from '@/shared/rules/first-species/opening'
import { breachAt, sonorityOf } from '@/shared/rules/first-species/sonority'
import { asRemark, goOn } from '@/shared/rules/fold'
import { isUpbeat } from '@/shared/rules/fourth-species/folds'
import { s4Open } from '@/shared/rules/fourth-species/s4-open'
import type { Exercise, Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  rest: z.enum(['required', 'optional']).default('required').describe('A half rest before the first note.'),
  above: openingList(['unison', 'fifth', 'octave'], 'First intervals above the cantus.'),
  below: openingList(['unison', 'octave'], 'First intervals below the cantus.'),
  tied: z.boolean().default(true).describe('A remark is made where the first half note is not tied over.'),
})
type Params = z.infer<typeof PARAMS>

/** The opening of fourth species, and whether a half note of the first bar waits to be tied. */
type State = Readonly<{ opening: Readonly<{ exercise: Exercise; isWaiting: boolean }>; isHalf: boolean }>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5Open: Rule<State, Params> = {
  id: 's5-open',
  level: 'law',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: (exercise) => ({ opening: { exercise, isWaiting: true }, isHalf: false }),
  step: ({ opening, isHalf }, moment, { tied, ...rest }) => {
    const next = s4Open.step(opening, moment, { ...rest, imperfect: false })
    const now = sonorityOf(moment)
    const isFirstHalf = opening.isWaiting && now !== null && isUpbeat(now) && next.breach === null
    const state = { opening: next.state, isHalf: isFirstHalf }
    if (next.breach !== null) return { state, breach: next.breach }
    const isLetGo = tied && isHalf && now !== null && now.place === 0 && now.isStruck
    return isLetGo ? { state, breach: asRemark(breachAt('not-tied', [now], {}, 'line')) } : goOn(state)
  },
  finish: () => null,
  key: ({ opening, isHalf }) => (opening.isWaiting ? 1 : 0) + (isHalf ? 2 : 0),
  explain: {
    title: 'Begin as in fourth species',
    statement: 'The line begins with a half rest and a perfect consonance, which is normally tied over.',
    why: 'The rest sets the line apart from the cantus, and the tie sets it in motion.',
    mends: 'Begin with a half rest and a half note that can be held over.',
    sources: cite('GIRT', 'OMT2', 'EX'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:2,C#5:2 D5'),
    wrong: example('A4:2,D5:2~ D5:2,A4:2~ A4:2,C#5:2 D5', [1]),
    messages: {
      'no-rest': 'The line begins on the beat, not after a half rest.',
      'not-half-rest': 'The rest at the beginning is not a half rest.',
      'not-perfect': 'The voices begin a {interval} apart, which is no perfect consonance.',
      'not-allowed': 'The voices begin a {interval} apart, which this rule set does not begin with.',
      'not-tied': 'The first note is not tied over the bar line.',
    },
  },
}
