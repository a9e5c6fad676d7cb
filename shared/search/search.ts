import type { Exercise, RuleId, RuleSet } from '@/shared/rules/rule'
import { findBest } from '@/shared/search/best'
import { createCostAutomaton, type CostAutomaton } from '@/shared/search/cost-automaton'
import { countThrough, countWaysOn, countWaysTo, type Counts } from '@/shared/search/counts'
import { findDeadEnd, type DeadEnd } from '@/shared/search/dead-end'
import { createGraph, type Graph, type Layer, type Limits } from '@/shared/search/graph'
import { narrow, readWritten, type Written } from '@/shared/search/narrow'
import { lineOf, pathAt, walkPaths } from '@/shared/search/paths'
import type { Places } from '@/shared/search/place'
import { poolOf, type Compass } from '@/shared/search/pool'
import { createPlaces } from '@/shared/search/places'
import { createSeeded } from '@/shared/search/seeded'
import { createStrangers } from '@/shared/search/strangers'
import { createWorld, rulesOfLine, type World } from '@/shared/search/world'
import type { Proposal } from '@/shared/rules/checker'
import type { SetAside } from '@/shared/rules/reading'
import type { Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

export type SearchOptions = Readonly<{
  /** Bars that are not read: the rest is finished as if they were not there. */
  setAside?: SetAside
  /** Lowest and highest note to be tried; else what the rules allow by law, else what lies near the cantus. */
  compass?: Compass
  limits?: Partial<Limits>
  /** What one remark of a rule costs the best lines, a whole number; 1 when left out. */
  weights?: Readonly<Record<RuleId, number>>
}>

/** Good lines, and what the preferences have to say against each: the sum of their remarks. */
export type Best = Readonly<{
  lines: readonly Readonly<{ line: Line; cost: number }>[]
  /** False when the search for them was cut short: better ones may exist. */
  isExact: boolean
}>

/** What is asked: ways to finish what is written. An offered gesture is written over the line. */
export type Question = Readonly<{ line?: Line; offered?: Proposal }>

/** At one place of the score, each note that some solution has there, and how many have it. */
export type AliveNotes = Readonly<{
  bar: number
  /** Ticks from the start of the bar. */
  place: number
  notes: readonly Readonly<{
    /** `null` for a rest. */
    pitch: PitchName | null
    ticks: number
    isTied: boolean
    /** Whether it is held over from the bar before. */
    isHeld: boolean
    count: bigint
  }>[]
}>

/** Ways to finish a line. Good until the next question is asked of the same search. */
export type Ways = Readonly<{
  count: bigint
  /** False when the limits were met: there are at least so many. */
  isExact: boolean
  /** For every place, the notes that still lead to an end, lowest first. */
  alive: () => readonly AliveNotes[]
  /** Where the line stops, and why; `null` when it can be finished. */
  deadEnd: DeadEnd | null
  /** So many different lines against which the preferences have least to say, the best first. */
  best: (howMany: number) => Best
  /** Draws evenly, with returning, from all whole lines. None when there are none. */
  draw: (seed: number, count: number) => readonly Line[]
  /** The whole lines in order: note by note, rests first, then from the lowest pitch up. */
  solutions: () => Generator<Line>
}>

/** A question at work, a little at a time. */
export type Inquiry = Readonly<{
  /** Goes on for about so many tries of a note; true when the answer is ready. */
  advance: (tries: number) => boolean
  /** The answer. Throws while it is not ready, and after another question has been asked. */
  ways: () => Ways
}>

/** Finds ways to finish lines of one exercise by the laws of one rule set. */
export type Search = Readonly<{
  ask: (question?: Question) => Inquiry
  /** Asks, and works until the answer is ready. */
  find: (question?: Question) => Ways
}>

const DEFAULT_LIMITS: Limits = { nodes: 3_000_000, beam: 2_000 }
const TRIES_AT_ONCE = 1_000_000

export function createSearch(exercise: Exercise, ruleSet: RuleSet, options: SearchOptions = {}): Search {
  const { setAside, compass } = options
  const limits = { ...DEFAULT_LIMITS, ...options.limits }
  const bars = exercise.cantus.map((_, index) => index + 1).filter((bar) => !setAside?.has(bar))
  const active = rulesOfLine(exercise, ruleSet)
  const pool = poolOf(exercise, active, compass)
  const strangers = createStrangers(exercise, bars, pool)
  let made: Readonly<{ world: World; graph: Graph }> | null = null
  let version = 0

  const make = (): Readonly<{ world: World; graph: Graph }> => {
    const places = createPlaces(exercise, bars, strangers.rhythmsAt, strangers.triedIn)
    const world = createWorld(exercise, active, places)
    return { world, graph: createGraph(world.members, places, limits) }
  }

  const ask = ({ line, offered }: Question = {}): Inquiry => {
    version += 1
    const asked = version
    const written = readWritten({ ...line, ...offered }, bars)
    if (strangers.admit(written) || made === null) made = make()
    const { world, graph } = made
    graph.restart(
      world.places.map((place, index) => narrow(place, world.tried[index] as Uint16Array, written)),
    )
    let answer: Ways | null = null
    const assertCurrent = (): void => {
      if (asked !== version) throw new Error('Another question has been asked of this search since.')
    }
    return {
      advance: (tries) => {
        assertCurrent()
        return graph.advance(tries)
      },
      ways: () => {
        assertCurrent()
        if (!graph.advance(0)) throw new Error('The answer is not ready yet.')
        return (answer ??= answerFrom(world, graph, written, options.weights ?? {}, assertCurrent))
      },
    }
  }

  return {
    ask,
    find: (question) => {
      const inquiry = ask(question)
      while (!inquiry.advance(TRIES_AT_ONCE));
      return inquiry.ways()
    },
  }
}

function answerFrom(
  world: World,
  graph: Graph,
  written: Written,
  weights: Readonly<Record<RuleId, number>>,
  assertCurrent: () => void,
): Ways {
  const { places } = world
  const waysOn = countWaysOn(graph, places)
  const count = BigInt(waysOn[0]?.[0] ?? 0)
  return {
    count,
    isExact: !graph.isCapped(),
    alive: () => {
      assertCurrent()
      return aliveOf(graph, places, waysOn)
    },
    deadEnd: count > 0n || graph.isCapped() ? null : findDeadEnd(graph, places, refusals(world, written)),
    best: (howMany) => {
      assertCurrent()
      const { paths, isExact } = findBest(graph, places, waysOn, pricedRules(world, weights), howMany)
      return { lines: paths.map(({ path, cost }) => ({ line: lineOf(path), cost })), isExact }
    },
    draw: (seed, times) => {
      assertCurrent()
      if (count === 0n) return []
      const seeded = createSeeded(seed)
      return Array.from({ length: times }, () => lineOf(pathAt(graph, places, waysOn, seeded.below(count))))
    },
    *solutions() {
      for (const path of walkPaths(graph, places, waysOn)) {
        assertCurrent()
        yield lineOf(path)
      }
    },
  }
}

/** Every rule that may make a remark on a line that breaks no law. */
function pricedRules(
  { active, exercise, places, remarking }: World,
  weights: Readonly<Record<RuleId, number>>,
): readonly CostAutomaton[] {
  const laws = remarking()
  return active
    .filter(({ rule, level }) => level === 'preference' || laws.has(rule.id))
    .map((rule) => createCostAutomaton(rule, exercise, places, weights[rule.rule.id] ?? 1))
}

/** Which laws refuse those choices of a place that agree with what is written, and were not tried. */
const refusals =
  (world: World, written: Written) =>
  (place: number): readonly (readonly RuleId[])[] => {
    const at = world.places[place] as Places[number]
    const all = Uint16Array.from(at.choices, (_, index) => index)
    const tried = new Set(world.tried[place])
    return [...narrow(at, all, written)]
      .filter((choice) => !tried.has(choice))
      .map((choice) => world.refusedAlways(place, choice))
  }

function aliveOf(graph: Graph, places: Places, waysOn: readonly Counts[]): readonly AliveNotes[] {
  const waysTo = countWaysTo(graph, places)
  const slots = new Map<number, Map<string, AliveNotes['notes'][number]>>()
  for (let index = 0; index < places.length - 1; index += 1) {
    const place = places[index] as Places[number]
    const through = countThrough(graph.layers[index] as Layer, place, waysTo[index] as Counts, waysOn)
    for (const [choice, count] of through.entries()) {
      if (count === 0n) continue
      for (const [turn, onset] of (
        place.choices[choice] as Places[number]['choices'][number]
      ).onsets.entries()) {
        const { pitch, ticks, isTied } = onset
        const at = 10_000 * onset.bar + onset.place
        const notes = slots.get(at) ?? new Map<string, AliveNotes['notes'][number]>()
        slots.set(at, notes)
        const isHeld = turn > 0
        const key = `${pitch ?? 'r'}:${ticks}${isTied ? '~' : ''}${isHeld ? '-' : ''}`
        const before = notes.get(key)?.count ?? 0n
        notes.set(key, { pitch, ticks, isTied, isHeld, count: before + count })
      }
    }
  }
  return [...slots]
    .sort(([a], [b]) => a - b)
    .map(([at, notes]) => ({ bar: Math.floor(at / 10_000), place: at % 10_000, notes: [...notes.values()] }))
}
