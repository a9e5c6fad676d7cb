import type { Given } from '@/shared/rules/first-species/folds'
import { sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { pack } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { stepsTo } from '@/shared/rules/second-species/folds'
import { moveKey, startMoves, stepMoves, type Moves } from '@/shared/rules/third-species/folds'
import type { Direction } from '@/shared/theory/interval'

/** What a figure still owes: so many more steps in one direction. */
export type Debt = Readonly<{ way: Direction; steps: 0 | 1 | 2; notes: readonly Sonority[] }>
export const NO_DEBT: Debt = { way: 0, steps: 0, notes: [] }

export type OwingState = Readonly<{ moves: Moves; debt: Debt }>

/** A breach, or what is owed from here on, or neither. */
export type Verdict = Readonly<{ breach: Breach } | { debt: Debt }> | null

/**
 * Folds a rule of a figure that, once begun, has to go on by step. `begin` finds it; `pay` looks at each note that is
 * owed, of which `steps` remain with this one, and says what is wrong with it. The first note that fails ends the debt.
 */
export const owing = <Params>(
  begin: (moves: Moves, now: Sonority, given: Given<Params>) => Verdict,
  pay: (debt: Debt, isStep: boolean, now: Sonority, given: Given<Params>) => Breach | null,
): Pick<Rule<OwingState, Params>, 'start' | 'step' | 'finish' | 'key' | 'reach'> => ({
  start: (exercise) => ({ moves: startMoves(exercise), debt: NO_DEBT }),
  step: ({ moves, debt }, moment, params) => {
    const now = sonorityOf(moment)
    const next = stepMoves(moves, moment)
    if (now === null) return { state: { moves: next, debt: NO_DEBT }, breach: null }
    const given = { exercise: moves.exercise, params, moment }
    if (debt.steps > 0 && moves.before !== null) {
      const isStep = stepsTo(moves.before, now) === debt.way
      const breach = pay(debt, isStep, now, given)
      if (breach !== null) return { state: { moves: next, debt: NO_DEBT }, breach }
      const left = (debt.steps - 1) as 0 | 1
      const paid = left === 0 ? NO_DEBT : { way: debt.way, steps: left, notes: [...debt.notes, now] }
      return { state: { moves: next, debt: paid }, breach: null }
    }
    const verdict = begin(moves, now, given)
    if (verdict === null) return { state: { moves: next, debt: NO_DEBT }, breach: null }
    return 'breach' in verdict
      ? { state: { moves: next, debt: NO_DEBT }, breach: verdict.breach }
      : { state: { moves: next, debt: verdict.debt }, breach: null }
  },
  finish: () => null,
  key: ({ moves, debt }) => pack([moveKey(moves), 2048], [debt.way + 1, 3], [debt.steps, 3]),
  reach: 4,
})
