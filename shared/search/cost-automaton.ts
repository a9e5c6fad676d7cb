import type { ActiveRule } from '@/shared/rules/rule-set'
import type { Exercise, Step } from '@/shared/rules/rule'
import { growTable, UNKNOWN } from '@/shared/search/automaton'
import type { Choice, Places } from '@/shared/search/place'
import { momentsRead } from '@/shared/search/rule-automaton'

/** One rule as a machine that goes on whatever it hears, and says what each choice costs. */
export type CostAutomaton = Readonly<{
  /** The state after a choice. */
  next: (place: number, state: number, choice: number) => number
  /** What that choice costs; `next` must have been asked. */
  cost: (place: number, state: number, choice: number) => number
  /** What the end costs in a state. */
  costOfEnd: (state: number) => number
}>

/** Makes a rule count its remarks, each at `weight`. State 0 at the first place is its start. */
export function createCostAutomaton(
  { rule, level, params }: ActiveRule,
  exercise: Exercise,
  places: Places,
  weight: number,
): CostAutomaton {
  const idsAt = places.map(() => new Map<number, number>())
  const statesAt: unknown[][] = places.map(() => [])
  const tables: Int32Array[] = []
  const costs: Int32Array[] = []
  const endCosts: number[] = []
  const priceOf = (breach: Step<unknown>['breach']): number =>
    breach !== null && (level === 'preference' || breach.isRemark) ? weight : 0

  const intern = (place: number, state: unknown): number => {
    const ids = idsAt[place] as Map<number, number>
    const key = rule.key(state)
    const known = ids.get(key)
    if (known !== undefined) return known
    ids.set(key, ids.size)
    ;(statesAt[place] as unknown[]).push(state)
    return ids.size - 1
  }
  intern(0, rule.start(exercise, params, 'line'))

  const sizeAt = (place: number): number => (places[place] as Places[number]).choices.length

  const work = (place: number, state: number, choice: number): number => {
    const taken = places[place]?.choices[choice] as Choice
    let now: unknown = (statesAt[place] as unknown[])[state]
    let cost = 0
    for (const moment of momentsRead({ rule, level, params }, taken)) {
      const step = rule.step(now, moment, params) as Step<unknown>
      cost += priceOf(step.breach)
      now = step.state
    }
    const next = intern(taken.next, now)
    const at = state * sizeAt(place) + choice
    const room = (statesAt[place] as unknown[]).length * sizeAt(place)
    ;(tables[place] = growTable(tables[place], room))[at] = next
    ;(costs[place] = growTable(costs[place], room))[at] = cost
    return next
  }

  return {
    next: (place, state, choice) => {
      const known = tables[place]?.[state * sizeAt(place) + choice]
      return known === undefined || known === UNKNOWN ? work(place, state, choice) : known
    },
    cost: (place, state, choice) => costs[place]?.[state * sizeAt(place) + choice] as number,
    costOfEnd: (state) =>
      (endCosts[state] ??= priceOf(rule.finish(statesAt[places.length - 1]?.[state], params, true))),
  }
}
