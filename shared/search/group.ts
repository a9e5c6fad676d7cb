import { DEAD, growTable, UNKNOWN, type Automaton } from '@/shared/search/automaton'
import type { Place, Places } from '@/shared/search/place'
import { createTupleTable, internTuple, type TupleTable } from '@/shared/search/tuple-table'

// Read once: bundlers turn what is imported into look-ups, which the innermost loop would feel.
const refused = DEAD
const notAsked = UNKNOWN
const intern = internTuple

/**
 * Several automata as one: its states are the tuples of theirs that occur. Laws that look back one note have a state a
 * note when taken together, so that a search of all the laws has a few fields to compare instead of dozens.
 */
export function createGroup(members: readonly Automaton[], places: Places): Automaton {
  const width = members.length
  const tuplesAt: TupleTable[] = places.map(() => createTupleTable(width))
  const tables: Int32Array[] = []
  const scratch = new Int32Array(width)
  const order = createOrder(width)
  let openPlace = -1
  let memberTables: readonly Int32Array[] = []

  const open = (place: number): void => {
    if (openPlace === place) return
    openPlace = place
    memberTables = members.map((member) => member.tableAt(place))
    order.sort()
  }

  return {
    start: () => {
      for (const member of members) member.start()
      internTuple(tuplesAt[0] as TupleTable, scratch.fill(0), width)
    },
    tableAt: (place) => {
      const { count } = tuplesAt[place] as TupleTable
      openPlace = -1
      return (tables[place] = growTable(tables[place], count * (places[place] as Place).choices.length))
    },
    advance: (place, state, choice) => {
      open(place)
      const { choices } = places[place] as Place
      const { values } = tuplesAt[place] as TupleTable
      const target = tables[place] as Int32Array
      const at = state * choices.length + choice
      for (let turn = 0; turn < width; turn += 1) {
        const field = order.fields[turn] as number
        const from = values[state * width + field] as number
        let next = (memberTables[field] as Int32Array)[from * choices.length + choice] as number
        if (next === notAsked) next = (members[field] as Automaton).advance(place, from, choice)
        if (next === refused) {
          order.count(field)
          return (target[at] = refused)
        }
        scratch[field] = next
      }
      const { next } = choices[choice] as Place['choices'][number]
      return (target[at] = intern(tuplesAt[next] as TupleTable, scratch, width))
    },
    accepts: (state) => {
      const { values } = tuplesAt[places.length - 1] as TupleTable
      return members.every((member, field) => member.accepts(values[state * width + field] as number))
    },
    blame: (place, state, choice, say) => {
      const { values } = tuplesAt[place] as TupleTable
      members.forEach((member, field) =>
        member.blame(place, values[state * width + field] as number, choice, say),
      )
    },
  }
}

/** The order in which members are asked: those that refuse most, first. */
export type Order = Readonly<{ fields: Int32Array; count: (field: number) => void; sort: () => void }>

export function createOrder(width: number): Order {
  const fields = Int32Array.from({ length: width }, (_, field) => field)
  const refusals = new Float64Array(width)
  return {
    fields,
    count: (field) => {
      refusals[field] = (refusals[field] as number) + 1
    },
    sort: () => {
      fields.sort((a, b) => (refusals[b] as number) - (refusals[a] as number) || a - b)
    },
  }
}
