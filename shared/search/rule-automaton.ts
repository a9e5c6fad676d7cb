import { DEAD, growTable, type Automaton } from '@/shared/search/automaton'
import type { Choice, Places } from '@/shared/search/place'
import type { ActiveRule } from '@/shared/rules/rule-set'
import type { Exercise, Moment, Step } from '@/shared/rules/rule'

// Read once: bundlers turn what is imported into look-ups, which the innermost loop would feel.
const refused = DEAD

/** One law as an automaton. */
export type RuleAutomaton = Automaton &
  Readonly<{
    ruleId: string
    /** How many moments back it looks; `Infinity` for the whole line. */
    reach: number
    /** Whether a choice breaks nothing from the state at the start. */
    permits: (choice: Choice) => boolean
    /** True while every state it has been in has the key of its start: it judges each choice by itself. */
    isStateless: () => boolean
    /** True once it has made a remark on the way, which a search of the laws passes over. */
    hasRemarked: () => boolean
  }>

/** What a rule reads of a choice. */
export const momentsRead = ({ rule }: ActiveRule, choice: Choice): readonly Moment[] =>
  rule.scope === 'pair' ? choice.pair : [choice.solo]

/** Makes an automaton of a law: states are told apart by their keys. */
export function createRuleAutomaton(active: ActiveRule, exercise: Exercise, places: Places): RuleAutomaton {
  const { rule, params } = active
  const readsPair = rule.scope === 'pair'
  const idsAt: Map<number, number>[] = places.map(() => new Map<number, number>())
  const statesAt: unknown[][] = places.map(() => [])
  const tables: Int32Array[] = []
  const accepted: boolean[] = []
  const startState: unknown = rule.start(exercise, params, 'line')
  const startKey = rule.key(startState)
  let isStateless = true
  let hasRemarked = false

  const intern = (place: number, state: unknown): number => {
    const key = rule.key(state)
    const ids = idsAt[place] as Map<number, number>
    const known = ids.get(key)
    if (known !== undefined) return known
    if (key !== startKey) isStateless = false
    const id = ids.size
    ids.set(key, id)
    ;(statesAt[place] as unknown[]).push(state)
    return id
  }

  /** Reads a choice from a state; gives the state after it, or `DEAD`. */
  const read = (from: unknown, choice: Choice): unknown => {
    if (!readsPair) {
      const { state, breach } = rule.step(from, choice.solo, params) as Step<unknown>
      if (breach === null) return state
      if (!breach.isRemark) return refused
      hasRemarked = true
      return state
    }
    let now = from
    for (const moment of choice.pair) {
      const { state, breach } = rule.step(now, moment, params) as Step<unknown>
      if (breach !== null) {
        if (!breach.isRemark) return refused
        hasRemarked = true
      }
      now = state
    }
    return now
  }

  const accepts = (state: number): boolean => {
    const known = accepted[state]
    if (known !== undefined) return known
    const breach = rule.finish(statesAt[places.length - 1]?.[state], params, true)
    if (breach?.isRemark) hasRemarked = true
    return (accepted[state] = breach === null || breach.isRemark === true)
  }

  return {
    ruleId: rule.id,
    reach: rule.reach ?? Infinity,
    permits: (choice) => {
      const after = read(startState, choice)
      if (after !== refused && rule.key(after) !== startKey) isStateless = false
      return after !== refused
    },
    isStateless: () => isStateless,
    hasRemarked: () => hasRemarked,
    start: () => void intern(0, startState),
    tableAt: (place) => {
      const states = (statesAt[place] as unknown[]).length
      const choices = (places[place] as Places[number]).choices.length
      return (tables[place] = growTable(tables[place], states * choices))
    },
    advance: (place, state, choice) => {
      const { choices } = places[place] as Places[number]
      const taken = choices[choice] as Choice
      const after = read((statesAt[place] as unknown[])[state], taken)
      const next = after === refused ? refused : intern(taken.next, after)
      ;(tables[place] as Int32Array)[state * choices.length + choice] = next
      return next
    },
    accepts,
    blame: (place, state, choice, say) => {
      if (choice === null) {
        if (!accepts(state)) say(rule.id)
        return
      }
      const taken = (places[place] as Places[number]).choices[choice] as Choice
      if (read((statesAt[place] as unknown[])[state], taken) === refused) say(rule.id)
    },
  }
}
