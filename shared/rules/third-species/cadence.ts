import { judgePenultimate } from '@/shared/rules/first-species/cadence'
import { breachAt, degreeIn, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn } from '@/shared/rules/fold'
import type { Breach, Exercise, Rule } from '@/shared/rules/rule'
import { HALF_TICKS } from '@/shared/theory/duration'

/** Formulas of the last bar but one by their figures against the cantus; `half`: two quarters and a half note. */
export type Formula = '3456' | '8756' | '3543' | '6543' | '6363' | 'half'

/** The notes of the bar under way, oldest first. */
export type CadenceState = Readonly<{ exercise: Exercise; bar: readonly Sonority[] }>

/** Figures of a bar, without octaves: an octave counts as 1, and is written 8 in the names of the formulas. */
const figuresOf = (notes: readonly Sonority[]): string =>
  notes.map(({ simpleSteps }) => (simpleSteps === 0 ? 8 : simpleSteps + 1)).join('')

/** Folds a rule of the last bar but one, in one position, by all of its notes. */
export const cadence = <Params>(
  position: Exercise['position'],
  formulasOf: (params: Params, exercise: Exercise) => readonly Formula[],
): Pick<Rule<CadenceState, Params>, 'start' | 'step' | 'finish' | 'key'> => ({
  start: (exercise) => ({ exercise, bar: [] }),
  step: ({ exercise, bar }, moment, params) => {
    const now = sonorityOf(moment)
    const earlier = moment.place === 0 ? [] : bar
    // A bar of more notes than four is no bar of this species.
    const notes = now === null || exercise.position !== position ? [] : [...earlier, now].slice(-4)
    if (now === null || exercise.position !== position || !moment.isPenultimate)
      return goOn({ exercise, bar: notes })
    return {
      state: { exercise, bar: notes },
      breach: judge(notes, now, exercise, formulasOf(params, exercise)),
    }
  },
  finish: () => null,
  key: ({ bar }) => bar.reduce((key, { simpleSteps }) => 8 * key + simpleSteps + 1, 0),
})

function judge(
  notes: readonly Sonority[],
  now: Sonority,
  exercise: Exercise,
  formulas: readonly Formula[],
): Breach | null {
  const breach = judgePenultimate(now, exercise)
  // The formulas belong to a cantus that comes down to its final. None asked for: only the last note is fixed.
  if (breach !== null || formulas.length === 0 || degreeIn(now.other, exercise) !== 2) return breach
  const figures = figuresOf(notes)
  if (formulas.some((formula) => formula === figures)) return null
  const endsInHalf = notes.length === 3 && now.place === HALF_TICKS
  if (endsInHalf && formulas.includes('half')) return null
  return breachAt('other-formula', notes, { figures: [...figures].join('–') })
}
