import type { Graph } from '@/shared/search/graph'
import type { Places } from '@/shared/search/place'
import type { RuleId } from '@/shared/rules/rule'

/** Why a line cannot be finished. */
export type DeadEnd = Readonly<{
  /** The earliest bar for which no note is left, 1-based. */
  bar: number
  /** The laws that refuse what is left to try there: together they refuse everything, and the gravest comes first. */
  rules: readonly RuleId[]
  /** `rhythm`: what is written in the bar has no place in the rhythm of the species, and laws were not asked. */
  because: 'laws' | 'rhythm'
}>

/** Enough nodes to know the rules by; there may be tens of thousands. */
const NODES_ASKED = 400

/**
 * Finds where a graph without a whole line stops. `refusedAlways` names the laws that refuse a choice of a place by
 * itself, for the choices that were never tried on that account.
 */
export function findDeadEnd(
  graph: Graph,
  places: Places,
  refusedAlways: (place: number) => readonly (readonly RuleId[])[],
): DeadEnd {
  let place = places.length - 1
  while (place > 0 && graph.nodeCountAt(place) === 0) place -= 1
  const isEnd = place === places.length - 1
  const refusals: (readonly RuleId[])[] = isEnd ? [] : [...refusedAlways(place)]
  graph.blame(place, NODES_ASKED, (rules) => void refusals.push(rules))
  const { bar } = places[isEnd ? Math.max(0, place - 1) : place] as Places[number]
  const told = refusals.filter((rules) => rules.length > 0)
  return { bar, rules: coverOf(told), because: told.length > 0 ? 'laws' : 'rhythm' }
}

/** A few rules of which every refusal has one: again and again the rule that most of the rest have. */
function coverOf(refusals: readonly (readonly RuleId[])[]): readonly RuleId[] {
  const cover: RuleId[] = []
  let left = refusals
  while (left.length > 0) {
    const counts = new Map<RuleId, number>()
    for (const rules of left) for (const rule of rules) counts.set(rule, (counts.get(rule) ?? 0) + 1)
    const [worst] = [...counts].reduce((a, b) => (b[1] > a[1] ? b : a))
    cover.push(worst)
    left = left.filter((rules) => !rules.includes(worst))
  }
  return cover
}
