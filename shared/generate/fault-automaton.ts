import { DEAD, growTable, type Automaton } from '@/shared/search/automaton'
import type { Choice, Places } from '@/shared/search/place'
import { momentsRead } from '@/shared/search/rule-automaton'
import { createTupleTable, internTuple, type TupleTable } from '@/shared/search/tuple-table'
import type { ActiveRule } from '@/shared/rules/rule-set'
import type { Breach, Exercise, Moment, Step } from '@/shared/rules/rule'

/** A rule that is to be broken, so many times. */
export type WantedFault = Readonly<{
  active: ActiveRule
  times: number
  /** The message that is wanted; breaches of the rule with another are refused. Any, when left out. */
  code?: string | undefined
}>

/** What a rule says of one choice from one state, once it has been asked. */
type Reading = Readonly<{ next: number; breaches: number; lastBar: number }>

/**
 * Rules that must be broken exactly so often, as one automaton: the laws' own folds run as ever, breaches are counted
 * in place of ending the line, and the line may end only with every count full. `apart` is the least number of bars
 * from the last bar of one fault to the last bar of the next; breaches told at the end of a line are counted, and their
 * distance is for whoever reads the line to judge.
 */
export function createFaultAutomaton(
  wanted: readonly WantedFault[],
  apart: number,
  exercise: Exercise,
  places: Places,
): Automaton {
  const readers = wanted.map((fault) => createReader(fault, exercise, places))
  // Fields: a state and a count for each rule, and the last bar of the last fault.
  const size = wanted.length
  const width = 2 * size + 1
  const tuplesAt: TupleTable[] = places.map(() => createTupleTable(width))
  const tables: Int32Array[] = []
  const scratch = new Int32Array(width)

  const valueAt = (place: number, state: number, field: number): number =>
    (tuplesAt[place] as TupleTable).values[state * width + field] as number

  /** Fills `scratch` with what comes of a choice; false when that is not wanted. */
  const take = (place: number, state: number, choice: number): boolean => {
    let lastEnd = valueAt(place, state, 2 * size)
    for (const [index, reader] of readers.entries()) {
      const count = valueAt(place, state, 2 * index + 1)
      const reading = reader.read(place, valueAt(place, state, 2 * index), choice)
      if (reading === null) return false
      if (reading.breaches > 0) {
        if (count + reading.breaches > (wanted[index] as WantedFault).times) return false
        if (lastEnd > 0 && reading.lastBar - lastEnd < apart) return false
        if (reading.breaches > 1 && apart > 0) return false
        lastEnd = Math.max(lastEnd, reading.lastBar)
      }
      scratch[2 * index] = reading.next
      scratch[2 * index + 1] = count + reading.breaches
    }
    scratch[2 * size] = lastEnd
    return true
  }

  return {
    start: () => {
      for (const reader of readers) reader.start()
      internTuple(tuplesAt[0] as TupleTable, scratch.fill(0), width)
    },
    tableAt: (place) => {
      const { count } = tuplesAt[place] as TupleTable
      const { choices } = places[place] as Places[number]
      return (tables[place] = growTable(tables[place], count * choices.length))
    },
    advance: (place, state, choice) => {
      const { choices } = places[place] as Places[number]
      const { next } = choices[choice] as Choice
      const to = take(place, state, choice) ? internTuple(tuplesAt[next] as TupleTable, scratch, width) : DEAD
      return ((tables[place] as Int32Array)[state * choices.length + choice] = to)
    },
    accepts: (state) =>
      readers.every((reader, index) => {
        const end = places.length - 1
        const told = reader.breachesAtEnd(valueAt(end, state, 2 * index))
        return told !== null && valueAt(end, state, 2 * index + 1) + told === wanted[index]?.times
      }),
    // Only laws are blamed; that a fault is missing is said by whoever asked for it.
    blame: () => undefined,
  }
}

type Reader = Readonly<{
  start: () => void
  /** `null` where the rule is broken in a way that is not wanted. */
  read: (place: number, state: number, choice: number) => Reading | null
  breachesAtEnd: (state: number) => number | null
}>

function createReader({ active, code }: WantedFault, exercise: Exercise, places: Places): Reader {
  const { rule, params } = active
  const idsAt = places.map(() => new Map<number, number>())
  const statesAt: unknown[][] = places.map(() => [])
  const readings = places.map(() => new Map<number, Reading | null>())

  const intern = (place: number, state: unknown): number => {
    const key = rule.key(state)
    const ids = idsAt[place] as Map<number, number>
    const known = ids.get(key)
    if (known !== undefined) return known
    const id = ids.size
    ids.set(key, id)
    ;(statesAt[place] as unknown[]).push(state)
    return id
  }

  const isUnwanted = ({ code: said }: Breach): boolean => code !== undefined && said !== code

  const work = (place: number, state: number, choice: number): Reading | null => {
    const taken = places[place]?.choices[choice] as Choice
    let now = statesAt[place]?.[state]
    let breaches = 0
    let lastBar = 0
    for (const moment of momentsRead(active, taken)) {
      const step = rule.step(now, moment satisfies Moment, params) as Step<unknown>
      now = step.state
      const { breach } = step
      if (breach === null || breach.isRemark) continue
      if (isUnwanted(breach)) return null
      breaches += 1
      lastBar = breach.bars.at(-1) ?? 0
    }
    return { next: intern(taken.next, now), breaches, lastBar }
  }

  return {
    start: () => void intern(0, rule.start(exercise, params, 'line')),
    read: (place, state, choice) => {
      const known = readings[place] as Map<number, Reading | null>
      const key = state * (places[place] as Places[number]).choices.length + choice
      const before = known.get(key)
      if (before !== undefined) return before
      const reading = work(place, state, choice)
      known.set(key, reading)
      return reading
    },
    breachesAtEnd: (state) => {
      const breach = rule.finish(statesAt[places.length - 1]?.[state], params, true)
      if (breach === null || breach.isRemark) return 0
      return isUnwanted(breach) ? null : 1
    },
  }
}
