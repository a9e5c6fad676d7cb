import { asBigIntegers, type Counts } from '@/shared/search/counts'
import type { Graph, Layer } from '@/shared/search/graph'
import type { Choice, Places } from '@/shared/search/place'
import type { BarNotes, Line, Note } from '@/shared/theory/note'

/** A whole line as the numbers of its choices, place by place as they are met. */
export type Path = readonly Choice[]

/** Writes a path as a line. */
export function lineOf(path: Path): Line {
  const line: Record<number, Note[]> = {}
  for (const { onsets } of path) {
    for (const { bar, pitch, ticks, isTied } of onsets) {
      const note: Note = isTied ? { pitch, ticks, tied: true } : { pitch, ticks }
      ;(line[bar] ??= []).push(note)
    }
  }
  return line satisfies Record<number, BarNotes>
}

/** The solution with so many before it, in the order of solutions. */
export function pathAt(graph: Graph, places: Places, waysOn: readonly Counts[], rank: bigint): Path {
  const end = places.length - 1
  const path: Choice[] = []
  let left = rank
  let place = 0
  let node = 0
  while (place < end) {
    const { starts, choices, targets } = graph.layers[place] as Layer
    let edge = starts[node] as number
    for (;;) {
      const choice = places[place]?.choices[choices[edge] as number] as Choice
      const ways = asBigIntegers(waysOn[choice.next])[targets[edge] as number] as bigint
      if (left < ways) break
      left -= ways
      edge += 1
    }
    const taken = places[place]?.choices[choices[edge] as number] as Choice
    path.push(taken)
    node = targets[edge] as number
    place = taken.next
  }
  return path
}

/** All solutions in their order: note by note, rests first, then from the lowest pitch up. */
export function* walkPaths(graph: Graph, places: Places, waysOn: readonly Counts[]): Generator<Path> {
  const end = places.length - 1
  const path: Choice[] = []
  function* from(place: number, node: number): Generator<Path> {
    if (place === end) {
      if (isOpen(waysOn[place], node)) yield [...path]
      return
    }
    const { starts, choices, targets } = graph.layers[place] as Layer
    for (let edge = starts[node] as number; edge < (starts[node + 1] as number); edge += 1) {
      const choice = places[place]?.choices[choices[edge] as number] as Choice
      const target = targets[edge] as number
      if (!isOpen(waysOn[choice.next], target)) continue
      path.push(choice)
      yield* from(choice.next, target)
      path.pop()
    }
  }
  yield* from(0, 0)
}

const isOpen = (counts: Counts | undefined, node: number): boolean => {
  const ways = counts?.[node]
  return ways !== undefined && ways > 0
}
