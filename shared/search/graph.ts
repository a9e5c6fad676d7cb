import { DEAD, UNKNOWN, type Automaton } from '@/shared/search/automaton'
import { createOrder } from '@/shared/search/group'
import type { Places } from '@/shared/search/place'
import { createTupleTable, internTuple, truncateTuples, type TupleTable } from '@/shared/search/tuple-table'

// Read once: bundlers turn what is imported into look-ups, which the innermost loop would feel.
const refused = DEAD
const notAsked = UNKNOWN
const intern = internTuple

/** The edges out of one place: node by node, and a node's in the order of its choices. */
export type Layer = {
  /** Where the edges of each node begin; one more than there are nodes. */
  starts: Int32Array
  choices: Uint16Array
  /** Nodes reached, numbered at the place their choice leads to. */
  targets: Int32Array
  edgeCount: number
  /** How many nodes each later place had when this one was done, so that later layers can be taken back. */
  reached: Int32Array
}

/** How far a question may go before it is answered with "at least". */
export type Limits = Readonly<{
  /** Nodes of all places together that are followed in full. */
  nodes: number
  /** Past that limit, the nodes of each place that are still followed. */
  beam: number
}>

/** The joint states of all laws, place by place, and the choices between them that break none. */
export type Graph = Readonly<{
  layers: readonly Layer[]
  nodeCountAt: (place: number) => number
  /** Takes up a new question; what it shares with the one before, from the first place on, is kept. */
  restart: (open: readonly Uint16Array[]) => void
  /** Goes on for about so many tries of a choice; true when all is built. */
  advance: (tries: number) => boolean
  /** True when some nodes were left out for the limits' sake. */
  isCapped: () => boolean
  /** Whether a line may end in a node of the last place. */
  accepts: (node: number) => boolean
  /** Says for every open choice of some nodes of a place, or for the end, which rules refuse it. */
  blame: (place: number, nodesAtMost: number, say: (rules: readonly string[]) => void) => void
}>

export function createGraph(members: readonly Automaton[], places: Places, limits: Limits): Graph {
  const width = members.length
  const end = places.length - 1
  const tuplesAt: TupleTable[] = places.map(() => createTupleTable(width))
  const order = createOrder(width)
  const scratch = new Int32Array(width)
  const layers: Layer[] = []
  let openAt: readonly Uint16Array[] = []
  /** The place at work, and its next node. */
  let place = 0
  let node = 0
  let tables: readonly Int32Array[] = []
  let nodesDone = 0
  let cappedAt = -1

  for (const member of members) member.start()
  internTuple(tuplesAt[0] as TupleTable, scratch.fill(0), width)

  const takeBackTo = (first: number): void => {
    const before = layers[first - 1]
    for (let later = first; later <= end; later += 1) {
      const kept = before === undefined ? (later === 0 ? 1 : 0) : (before.reached[later] as number)
      truncateTuples(tuplesAt[later] as TupleTable, kept, width)
    }
    layers.length = Math.min(layers.length, first)
    place = first
    node = 0
    nodesDone = 0
    for (let done = 0; done < first; done += 1) nodesDone += (tuplesAt[done] as TupleTable).count
  }

  const beginPlace = (): Layer => {
    const { count } = tuplesAt[place] as TupleTable
    const guess = Math.max(16, 4 * count)
    const layer: Layer = {
      starts: new Int32Array(count + 1),
      choices: new Uint16Array(guess),
      targets: new Int32Array(guess),
      edgeCount: 0,
      reached: new Int32Array(0),
    }
    layers[place] = layer
    tables = members.map((member) => member.tableAt(place))
    order.sort()
    if (cappedAt < 0 && nodesDone + count > limits.nodes) cappedAt = place
    return layer
  }

  const endPlace = (layer: Layer): void => {
    const { count } = tuplesAt[place] as TupleTable
    layer.starts[count] = layer.edgeCount
    layer.reached = Int32Array.from(tuplesAt, (tuples) => tuples.count)
    nodesDone += count
    place += 1
    node = 0
  }

  const expand = (layer: Layer, open: Uint16Array): void => {
    const { choices } = places[place] as Places[number]
    const size = choices.length
    const { values } = tuplesAt[place] as TupleTable
    const base = node * width
    const { fields } = order
    makeRoom(layer, open.length)
    let { edgeCount } = layer
    next: for (let turn = 0; turn < open.length; turn += 1) {
      const choice = open[turn] as number
      for (let rank = 0; rank < width; rank += 1) {
        const field = fields[rank] as number
        const from = values[base + field] as number
        let to = (tables[field] as Int32Array)[from * size + choice] as number
        if (to === notAsked) to = (members[field] as Automaton).advance(place, from, choice)
        if (to === refused) {
          order.count(field)
          continue next
        }
        scratch[field] = to
      }
      const target = (choices[choice] as Places[number]['choices'][number]).next
      layer.choices[edgeCount] = choice
      layer.targets[edgeCount] = intern(tuplesAt[target] as TupleTable, scratch, width)
      edgeCount += 1
    }
    layer.edgeCount = edgeCount
  }

  return {
    layers,
    nodeCountAt: (at) => (tuplesAt[at] as TupleTable).count,
    restart: (open) => {
      let first = 0
      const unlike = (at: number) => !isSameList(openAt[at], open[at])
      while (first < layers.length && first < place && first !== cappedAt && !unlike(first)) first += 1
      openAt = open
      if (first <= cappedAt) cappedAt = -1
      takeBackTo(first)
    },
    advance: (tries) => {
      let left = tries
      while (place < end && left > 0) {
        const layer = node === 0 ? beginPlace() : (layers[place] as Layer)
        const { count } = tuplesAt[place] as TupleTable
        const open = openAt[place] as Uint16Array
        const stride = cappedAt >= 0 ? Math.max(1, Math.ceil(count / limits.beam)) : 1
        for (; node < count && left > 0; node += 1) {
          layer.starts[node] = layer.edgeCount
          if (node % stride !== 0) continue
          expand(layer, open)
          left -= open.length + 1
        }
        if (node >= count) endPlace(layer)
      }
      return place >= end
    },
    isCapped: () => cappedAt >= 0,
    accepts: (at) => {
      const { values } = tuplesAt[end] as TupleTable
      return members.every((member, field) => member.accepts(values[at * width + field] as number))
    },
    blame: (at, nodesAtMost, say) => {
      const { values, count } = tuplesAt[at] as TupleTable
      const asked: readonly (number | null)[] = at === end ? [null] : [...(openAt[at] as Uint16Array)]
      for (let from = 0; from < Math.min(count, nodesAtMost); from += 1) {
        for (const choice of asked) {
          const rules: string[] = []
          const tell = (ruleId: string) => void rules.push(ruleId)
          members.forEach((member, field) =>
            member.blame(at, values[from * width + field] as number, choice, tell),
          )
          say(rules)
        }
      }
    },
  }
}

function makeRoom(layer: Layer, more: number): void {
  const needed = layer.edgeCount + more
  if (needed <= layer.targets.length) return
  const choices = new Uint16Array(2 * needed)
  choices.set(layer.choices)
  layer.choices = choices
  const targets = new Int32Array(2 * needed)
  targets.set(layer.targets)
  layer.targets = targets
}

const isSameList = (a: Uint16Array | undefined, b: Uint16Array | undefined): boolean =>
  a === b || (a !== undefined && a.length === b?.length && a.every((value, index) => value === b[index]))
