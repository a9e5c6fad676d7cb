import type { Graph, Layer } from '@/shared/search/graph'
import type { Places } from '@/shared/search/place'

/** Numbers of paths, by node: plain numbers while they are exact, big integers beyond. */
export type Counts = Float64Array | readonly bigint[]

const SAFE = Number.MAX_SAFE_INTEGER

/** For every node of every place, in how many ways it can be gone on from to the end. */
export function countWaysOn(graph: Graph, places: Places): readonly Counts[] {
  const end = places.length - 1
  const counts = new Array<Counts>(places.length)
  const last = new Float64Array(graph.nodeCountAt(end))
  for (let node = 0; node < last.length; node += 1) last[node] = graph.accepts(node) ? 1 : 0
  counts[end] = last
  for (let place = end - 1; place >= 0; place -= 1) {
    const layer = graph.layers[place] as Layer
    counts[place] = onInNumbers(layer, place, places, counts) ?? onInBigIntegers(layer, place, places, counts)
  }
  return counts
}

/** The sums of one place in plain numbers, or `null` where they would not be exact. */
function onInNumbers(
  { starts, choices, targets }: Layer,
  place: number,
  places: Places,
  counts: readonly Counts[],
): Float64Array | null {
  const next = (places[place] as Places[number]).choices.map((choice) => counts[choice.next])
  if (next.some((later) => later !== undefined && !(later instanceof Float64Array))) return null
  const later = next as readonly Float64Array[]
  const sums = new Float64Array(starts.length - 1)
  for (let node = 0; node < sums.length; node += 1) {
    let sum = 0
    const stop = starts[node + 1] as number
    for (let edge = starts[node] as number; edge < stop; edge += 1) {
      sum += (later[choices[edge] as number] as Float64Array)[targets[edge] as number] as number
    }
    if (sum > SAFE) return null
    sums[node] = sum
  }
  return sums
}

function onInBigIntegers(
  { starts, choices, targets }: Layer,
  place: number,
  places: Places,
  counts: readonly Counts[],
): readonly bigint[] {
  const next = (places[place] as Places[number]).choices.map((choice) => asBigIntegers(counts[choice.next]))
  const sums = new Array<bigint>(starts.length - 1)
  for (let node = 0; node < sums.length; node += 1) {
    let sum = 0n
    const stop = starts[node + 1] as number
    for (let edge = starts[node] as number; edge < stop; edge += 1) {
      sum += next[choices[edge] as number]?.[targets[edge] as number] as bigint
    }
    sums[node] = sum
  }
  return sums
}

/** For every node of every place, in how many ways it is come to. */
export function countWaysTo(graph: Graph, places: Places): readonly Counts[] {
  const end = places.length - 1
  const plain = places.map((_, place) => new Float64Array(graph.nodeCountAt(place)))
  ;(plain[0] as Float64Array)[0] = 1
  let isExact = true
  for (let place = 0; place < end && isExact; place += 1) {
    const { starts, choices, targets } = graph.layers[place] as Layer
    const next = (places[place] as Places[number]).choices.map((choice) => plain[choice.next] as Float64Array)
    const here = plain[place] as Float64Array
    for (let node = 0; node < here.length; node += 1) {
      const ways = here[node] as number
      if (ways > SAFE) isExact = false
      const stop = starts[node + 1] as number
      for (let edge = starts[node] as number; edge < stop; edge += 1) {
        const target = targets[edge] as number
        const later = next[choices[edge] as number] as Float64Array
        later[target] = (later[target] as number) + ways
      }
    }
  }
  if (isExact && (plain[end] as Float64Array).every((ways) => ways <= SAFE)) return plain
  return countWaysToInBigIntegers(graph, places)
}

function countWaysToInBigIntegers(graph: Graph, places: Places): readonly (readonly bigint[])[] {
  const end = places.length - 1
  const big = places.map((_, place) => new Array<bigint>(graph.nodeCountAt(place)).fill(0n))
  ;(big[0] as bigint[])[0] = 1n
  for (let place = 0; place < end; place += 1) {
    const { starts, choices, targets } = graph.layers[place] as Layer
    const next = (places[place] as Places[number]).choices.map((choice) => big[choice.next] as bigint[])
    const here = big[place] as bigint[]
    for (let node = 0; node < here.length; node += 1) {
      const ways = here[node] as bigint
      const stop = starts[node + 1] as number
      for (let edge = starts[node] as number; edge < stop; edge += 1) {
        const later = next[choices[edge] as number] as bigint[]
        const target = targets[edge] as number
        later[target] = (later[target] as bigint) + ways
      }
    }
  }
  return big
}

/** How many whole lines take each choice of a place. */
export function countThrough(
  layer: Layer,
  place: Places[number],
  waysTo: Counts,
  waysOn: readonly Counts[],
): readonly bigint[] {
  const size = place.choices.length
  const next = place.choices.map((choice) => waysOn[choice.next] as Counts)
  const { starts, choices, targets } = layer
  const nodeCount = starts.length - 1
  if (waysTo instanceof Float64Array && next.every((later) => later instanceof Float64Array)) {
    const plain = new Float64Array(size)
    for (let node = 0; node < nodeCount; node += 1) {
      const to = waysTo[node] as number
      const stop = starts[node + 1] as number
      for (let edge = starts[node] as number; edge < stop; edge += 1) {
        const choice = choices[edge] as number
        const on = (next[choice] as Float64Array)[targets[edge] as number] as number
        plain[choice] = (plain[choice] as number) + to * on
      }
    }
    if (plain.every((ways) => ways <= SAFE)) return Array.from(plain, BigInt)
  }
  const to = asBigIntegers(waysTo)
  const on = next.map(asBigIntegers)
  const sums = new Array<bigint>(size).fill(0n)
  for (let node = 0; node < nodeCount; node += 1) {
    const stop = starts[node + 1] as number
    for (let edge = starts[node] as number; edge < stop; edge += 1) {
      const choice = choices[edge] as number
      const ways = (to[node] as bigint) * (on[choice]?.[targets[edge] as number] as bigint)
      sums[choice] = (sums[choice] as bigint) + ways
    }
  }
  return sums
}

const asBigKnown = new WeakMap<Float64Array, readonly bigint[]>()

/** Counts as big integers; worked out once for each array, since several choices lead to one place. */
export function asBigIntegers(counts: Counts | undefined): readonly bigint[] {
  if (counts === undefined) return []
  if (!(counts instanceof Float64Array)) return counts
  const known = asBigKnown.get(counts)
  if (known) return known
  const big = Array.from(counts, BigInt)
  asBigKnown.set(counts, big)
  return big
}
