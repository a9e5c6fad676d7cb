import { cite } from '@/shared/rules/cite'
import { NO_PARAMS, type NoParams } from '@/shared/rules/first-species/folds'
import { breachAt, degreeIn, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'

/** What of the two degrees the bar under way has had so far, in either voice. */
type State = Readonly<{ exercise: Exercise; hasSecond: boolean; hasSeventh: boolean }>

/** By letters alone: whether the seventh is raised is the matter of `cad-raise-seventh`. */
export const s2PenultDegrees: Rule<State, NoParams> = {
  id: 's2-penult-degrees',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: NO_PARAMS,
  start: (exercise) => ({ exercise, hasSecond: false, hasSeventh: false }),
  step: ({ exercise, hasSecond, hasSeventh }, moment) => {
    const now = sonorityOf(moment)
    const isNew = moment.place === 0
    const has = (degree: number): boolean => now !== null && hasDegree(now, degree, exercise)
    const state = {
      exercise,
      hasSecond: (!isNew && hasSecond) || has(2),
      hasSeventh: (!isNew && hasSeventh) || has(7),
    }
    if (now === null || !moment.isPenultimate) return goOn(state)
    // Where the reduction leaves the cantus on another degree there is no close of this kind.
    const cantusDegree = degreeIn(now.other, exercise)
    if (cantusDegree !== 2 && cantusDegree !== 7) return goOn(state)
    const code = !state.hasSeventh ? 'no-seventh' : state.hasSecond ? null : 'no-second'
    return { state, breach: code === null ? null : breachAt(code, [now]) }
  },
  finish: () => null,
  key: ({ hasSecond, hasSeventh }) => (hasSecond ? 2 : 0) + (hasSeventh ? 1 : 0),
  explain: {
    title: 'Both neighbours of the final before the close',
    statement:
      'The last bar but one contains both the second degree and the leading tone, one in each voice.',
    why: 'The final is reached from above and from below at once; with one of the two missing the close is weak.',
    mends: 'Write the degree that the cantus does not have.',
    sources: cite('LEHM II'),
    right: shortExample(SHORT_LINE),
    wrong: shortExample('r:2,A4:2 D5:2,A4:2 B4:2,G4:2 D5', [3]),
    messages: {
      'no-seventh': 'The last bar but one has no leading tone.',
      'no-second': 'The last bar but one has no second degree.',
    },
  },
}

const hasDegree = (now: Sonority, degree: number, exercise: Exercise): boolean =>
  degreeIn(now.note, exercise) === degree || degreeIn(now.other, exercise) === degree
