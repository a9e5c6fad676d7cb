import { countWaysOn } from '@/shared/search/counts'
import { createGraph, type Limits } from '@/shared/search/graph'
import { pathAt, type Path } from '@/shared/search/paths'
import type { Seeded } from '@/shared/search/seeded'
import type { World } from '@/shared/search/world'
import type { Automaton } from '@/shared/search/automaton'

/** Everything that keeps a set of automata, ready to be drawn from. */
export type Walk = Readonly<{
  count: bigint
  /** False when the limits were met: there is more than this, and what is drawn is not drawn evenly. */
  isExact: boolean
  /** Draws one path evenly from all. Throws where there is none. */
  draw: (seeded: Seeded) => Path
}>

/** Keeps a generator within a second or so, and within some tens of megabytes. */
export const LIMITS: Limits = { nodes: 200_000, beam: 400 }
const TRIES_AT_ONCE = 1_000_000

/** For asking why there is nothing: many walks, each short. What they find is there; what they do not may be. */
export const SHORT_LIMITS: Limits = { nodes: 15_000, beam: 100 }

/** Walks all ways through some places that the laws of a world, and further automata, let pass. */
export function walkAll(world: World, further: readonly Automaton[] = [], limits: Limits = LIMITS): Walk {
  const { places } = world
  const graph = createGraph([...world.members, ...further], places, limits)
  graph.restart(world.tried)
  while (!graph.advance(TRIES_AT_ONCE));
  const waysOn = countWaysOn(graph, places)
  const count = BigInt(waysOn[0]?.[0] ?? 0)
  return {
    count,
    isExact: !graph.isCapped(),
    draw: (seeded) => pathAt(graph, places, waysOn, seeded.below(count)),
  }
}
