import type { CostAutomaton } from '@/shared/search/cost-automaton'
import type { Followers } from '@/shared/search/followers'
import type { Choice, Places } from '@/shared/search/place'

/** The least that a rule will still cost from a state, after an arrival at a place. Never too high. */
export type Estimate = (place: number, arrival: number, state: number) => number

/** A rule with more states than this is estimated at nothing: to know it better would cost more than it saves. */
const MOST_STATES = 6_000

export const createEstimates = (
  automata: readonly CostAutomaton[],
  places: Places,
  followers: Followers,
): readonly Estimate[] => automata.map((automaton) => createEstimate(automaton, places, followers))

function createEstimate(automaton: CostAutomaton, places: Places, followers: Followers): Estimate {
  const end = places.length - 1
  const known = places.map(() => new Map<number, number>())
  let states = 0
  const estimate = (place: number, arrival: number, state: number): number => {
    if (place === end) return automaton.costOfEnd(state)
    const name = 65_536 * state + arrival
    const memo = known[place] as Map<number, number>
    const before = memo.get(name)
    if (before !== undefined) return before
    if (states >= MOST_STATES) return 0
    states += 1
    let least = Infinity
    for (const choice of followers.after(place, arrival)) {
      const next = automaton.next(place, state, choice)
      const paid = automaton.cost(place, state, choice)
      if (paid >= least) continue
      const to = (places[place]?.choices[choice] as Choice).next
      least = Math.min(least, paid + estimate(to, followers.arrivalOf(place, choice), next))
      if (least === 0) break
    }
    memo.set(name, least)
    return least
  }
  return estimate
}
