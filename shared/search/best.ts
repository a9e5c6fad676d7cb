/**
 * The best whole lines by preference: a best-first walk over the laws' graph with the preferences' states beside it.
 * What is still to be paid is estimated from below, rule by rule, over pairs of notes that follow each other in some
 * solution; an estimate that is never too high makes the first lines to arrive the best ones.
 */
import type { CostAutomaton } from '@/shared/search/cost-automaton'
import type { Counts } from '@/shared/search/counts'
import { createEstimates, type Estimate } from '@/shared/search/estimate'
import { createFollowers } from '@/shared/search/followers'
import type { Graph, Layer } from '@/shared/search/graph'
import type { Path } from '@/shared/search/paths'
import type { Choice, Places } from '@/shared/search/place'
import { createTupleTable, internTuple, type TupleTable } from '@/shared/search/tuple-table'

export type CostedPath = Readonly<{ path: Path; cost: number }>
export type BestPaths = Readonly<{
  paths: readonly CostedPath[]
  /** False when the walk was cut short: the lines are good ones, and better ones may exist. */
  isExact: boolean
}>

/** A line begun: where it stands, and what it has cost. */
type Begun = Readonly<{
  before: Begun | null
  choice: Choice | null
  place: number
  node: number
  /** Place and number of the choice that led here, as the estimates know it. */
  arrival: number
  /** Number of the preferences' states at the place. */
  tuple: number
  cost: number
}>

const MOST_EXPANSIONS = 150_000

export function findBest(
  graph: Graph,
  places: Places,
  waysOn: readonly Counts[],
  automata: readonly CostAutomaton[],
  howMany: number,
  mostExpansions = MOST_EXPANSIONS,
): BestPaths {
  const end = places.length - 1
  const width = automata.length
  const tuplesAt: TupleTable[] = places.map(() => createTupleTable(width))
  const followers = createFollowers(graph, places, waysOn)
  const estimates = createEstimates(automata, places, followers)
  const queue = createQueue(places.length)
  const visits = new Map<string, number>()
  const scratch = new Int32Array(width)
  const found: CostedPath[] = []

  const tuple = internTuple(tuplesAt[0] as TupleTable, scratch.fill(0), width)
  queue.push({ before: null, choice: null, place: 0, node: 0, arrival: 0, tuple, cost: 0 }, 0)

  const expand = (begun: Begun): void => {
    const { place, node, cost } = begun
    const { starts, choices, targets } = graph.layers[place] as Layer
    const from = begun.tuple * width
    for (let edge = starts[node] as number; edge < (starts[node + 1] as number); edge += 1) {
      const index = choices[edge] as number
      const choice = places[place]?.choices[index] as Choice
      const target = targets[edge] as number
      if (!((waysOn[choice.next]?.[target] as number | bigint) > 0)) continue
      const { values } = tuplesAt[place] as TupleTable
      let paid = cost
      for (let field = 0; field < width; field += 1) {
        const state = values[from + field] as number
        const automaton = automata[field] as CostAutomaton
        scratch[field] = automaton.next(place, state, index)
        paid += automaton.cost(place, state, index)
      }
      const arrival = followers.arrivalOf(place, index)
      const owed = oweAtLeast(estimates, choice.next, arrival, scratch)
      const reached = internTuple(tuplesAt[choice.next] as TupleTable, scratch, width)
      const next = {
        before: begun,
        choice,
        place: choice.next,
        node: target,
        arrival,
        tuple: reached,
        cost: paid,
      }
      queue.push(next, paid + owed)
    }
  }

  let expansions = 0
  while (found.length < howMany) {
    const begun = expansions < mostExpansions ? queue.popBest() : queue.popDeepest()
    if (begun === null) break
    const name = `${begun.place} ${begun.node} ${begun.arrival} ${begun.tuple}`
    const visit = visits.get(name) ?? 0
    if (visit >= howMany) continue
    visits.set(name, visit + 1)
    if (begun.place === end) {
      found.push({ path: pathOf(begun), cost: begun.cost + endCost(automata, tuplesAt[end], begun.tuple) })
    } else {
      expand(begun)
      expansions += 1
    }
  }
  found.sort((a, b) => a.cost - b.cost)
  return { paths: found, isExact: expansions < mostExpansions && !graph.isCapped() }
}

function oweAtLeast(
  estimates: readonly Estimate[],
  place: number,
  arrival: number,
  states: Int32Array,
): number {
  let owed = 0
  for (let field = 0; field < estimates.length; field += 1) {
    owed += (estimates[field] as Estimate)(place, arrival, states[field] as number)
  }
  return owed
}

function endCost(automata: readonly CostAutomaton[], tuples: TupleTable | undefined, tuple: number): number {
  const from = tuple * automata.length
  return automata.reduce(
    (sum, { costOfEnd }, field) => sum + costOfEnd(tuples?.values[from + field] as number),
    0,
  )
}

function pathOf(begun: Begun): Path {
  const path: Choice[] = []
  for (let at: Begun | null = begun; at?.choice; at = at.before) path.push(at.choice)
  return path.reverse()
}

/** Lines begun, by what they will cost at least; among equals the furthest first, then the last that came. */
function createQueue(placeCount: number) {
  const byCost: Begun[][][] = []
  let cheapest = 0
  const takeFrom = (stacks: Begun[][] | undefined): Begun | null => {
    for (let place = placeCount - 1; place >= 0; place -= 1) {
      const begun = stacks?.[place]?.pop()
      if (begun) return begun
    }
    return null
  }
  return {
    push: (begun: Begun, owed: number): void => {
      const stacks = (byCost[owed] ??= [])
      ;(stacks[begun.place] ??= []).push(begun)
      cheapest = Math.min(cheapest, owed)
    },
    popBest: (): Begun | null => {
      for (; cheapest < byCost.length; cheapest += 1) {
        const begun = takeFrom(byCost[cheapest])
        if (begun) return begun
      }
      return null
    },
    popDeepest: (): Begun | null => {
      for (let place = placeCount - 1; place >= 0; place -= 1) {
        for (const stacks of byCost) {
          const begun = stacks?.[place]?.pop()
          if (begun) return begun
        }
      }
      return null
    },
  }
}
