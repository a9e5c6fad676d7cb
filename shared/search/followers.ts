import type { Counts } from '@/shared/search/counts'
import type { Graph, Layer } from '@/shared/search/graph'
import type { Choice, Places } from '@/shared/search/place'

/** Which choice may follow which in some solution. An arrival is a choice as the place it leads to knows it. */
export type Followers = Readonly<{
  arrivalOf: (place: number, choice: number) => number
  /** Choices at a place that follow an arrival at it; arrival 0 is the beginning of the line. */
  after: (place: number, arrival: number) => readonly number[]
}>

export function createFollowers(graph: Graph, places: Places, waysOn: readonly Counts[]): Followers {
  const arrivals = numberArrivals(places)
  const arrivalOf = (place: number, choice: number): number => arrivals[place]?.[choice] as number
  const arrivedAt = places.map((_, place) =>
    Array.from({ length: graph.nodeCountAt(place) }, () => new Set<number>()),
  )
  arrivedAt[0]?.[0]?.add(0)
  const follow = places.map(() => new Map<number, Set<number>>())
  for (let place = 0; place < places.length - 1; place += 1) {
    const { starts, choices, targets } = graph.layers[place] as Layer
    for (const [node, came] of (arrivedAt[place] ?? []).entries()) {
      for (let edge = starts[node] as number; edge < (starts[node + 1] as number); edge += 1) {
        const choice = choices[edge] as number
        const target = targets[edge] as number
        const { next } = places[place]?.choices[choice] as Choice
        if (!((waysOn[next]?.[target] as number | bigint) > 0)) continue
        arrivedAt[next]?.[target]?.add(arrivalOf(place, choice))
        for (const arrival of came) {
          const known = follow[place]?.get(arrival)
          if (known) known.add(choice)
          else follow[place]?.set(arrival, new Set([choice]))
        }
      }
    }
  }
  const lists = follow.map((sets) => new Map([...sets].map(([arrival, set]) => [arrival, [...set]])))
  return { arrivalOf, after: (place, arrival) => lists[place]?.get(arrival) ?? [] }
}

/** Numbers choices by the place they lead to, from 1. */
function numberArrivals(places: Places): readonly (readonly number[])[] {
  const count = places.map(() => 0)
  return places.map(({ choices }) =>
    choices.map(({ next }) => {
      count[next] = (count[next] as number) + 1
      return count[next] as number
    }),
  )
}
