import { createFaultAutomaton, type WantedFault } from '@/shared/generate/fault-automaton'
import type { GenerationProblem } from '@/shared/generate/generation-problem'
import { SHORT_LIMITS, walkAll, type Walk } from '@/shared/generate/walk'
import { fail, ok, type Result } from '@/shared/result'
import { createChecker, type Checker } from '@/shared/rules/checker'
import { findRule } from '@/shared/rules/registry'
import type { ActiveRule } from '@/shared/rules/rule-set'
import type { Exercise, Finding, RuleId, RuleSet } from '@/shared/rules/rule'
import { lineOf } from '@/shared/search/paths'
import type { Limits } from '@/shared/search/graph'
import type { Places } from '@/shared/search/place'
import { createPlaces } from '@/shared/search/places'
import { poolOf, type Compass } from '@/shared/search/pool'
import { rhythmsOf } from '@/shared/search/rhythm'
import { createSeeded } from '@/shared/search/seeded'
import { createWorld, rulesOfLine } from '@/shared/search/world'
import type { Line } from '@/shared/theory/note'
import { diatonicNumber, formatPitch, HIGHEST_OCTAVE, LETTERS, type Letter } from '@/shared/theory/pitch'

/** A rule to be broken, how often, and in which way where one of its messages is meant. */
export type Fault = Readonly<{ rule: RuleId; times: number; code?: string }>

export type FaultRequest = Readonly<{
  exercise: Exercise
  ruleSet: RuleSet
  faults: readonly Fault[]
  /** Fewest bars from the end of one fault to the end of the next; 2 when left out, 0 lets them coincide. */
  apart?: number
  compass?: Compass
}>

export type FaultExercise = Readonly<{
  line: Line
  /** The faults, in the order of the bars they end in: what a solver is to find. */
  answerKey: readonly Finding[]
  /** How many such lines there are; some of them may have two faults closer together than was asked. */
  count: bigint
  isExact: boolean
}>

export const MOST_FAULTS = 8
export const USUAL_APART = 2
/** Lines drawn before giving up on the distance between faults that only the whole line tells. */
const MOST_DRAWS = 400
/** How far beyond the compass a line may be led astray where it must: a third. */
const STRAY_STEPS = 2

/** A request made ready: every draw from it costs little. */
export type FaultSource = Readonly<{
  count: bigint
  isExact: boolean
  draw: (seed: number) => Result<FaultExercise, GenerationProblem>
}>

/**
 * Draws a line with exactly the faults asked for and no other breach of law, evenly from all there are. Remarks of
 * preferences are let stand, unless such a rule is itself asked for. For many draws prepare a source and keep it.
 */
export function generateFaults(
  request: FaultRequest & Readonly<{ seed: number }>,
): Result<FaultExercise, GenerationProblem> {
  const source = prepareFaults(request)
  return source.ok ? source.value.draw(request.seed) : source
}

export function prepareFaults(request: FaultRequest): Result<FaultSource, GenerationProblem> {
  const { exercise, ruleSet, faults, apart = USUAL_APART } = request
  const wanted = readFaults(faults, exercise, ruleSet)
  if (!wanted.ok) return wanted
  if (!Number.isInteger(apart) || apart < 0) {
    return problem('bad-request', 'The distance between faults is a whole number of bars, 0 or more.')
  }
  let walk = walkWith(request, wanted.value, apart)
  if (walk.count === 0n && walk.isExact) walk = walkWith(request, wanted.value, apart, STRAY_STEPS)
  if (walk.count === 0n) return explain(request, wanted.value, walk, apart)
  const checker = createChecker(exercise, ruleSet)
  const { count, isExact } = walk
  const draw = (seed: number): Result<FaultExercise, GenerationProblem> => {
    const seeded = createSeeded(seed)
    for (let turn = 0; turn < MOST_DRAWS; turn += 1) {
      const line = lineOf(walk.draw(seeded))
      const answerKey = readAnswerKey(checker, line, faults, apart)
      if (answerKey) return ok({ line, answerKey, count, isExact })
    }
    const message = `Among ${MOST_DRAWS} lines with these faults none had them as far apart as was asked.`
    return problem(
      'not-found',
      message,
      faults.map(({ rule }) => rule),
    )
  }
  return ok({ count, isExact, draw })
}

const problem = (code: GenerationProblem['code'], message: string, rules: readonly RuleId[] = []) =>
  fail({ code, message, rules })

function readFaults(
  faults: readonly Fault[],
  exercise: Exercise,
  ruleSet: RuleSet,
): Result<readonly WantedFault[], GenerationProblem> {
  const total = faults.reduce((sum, { times }) => sum + times, 0)
  const isWhole = faults.every(({ times }) => Number.isInteger(times) && times >= 1)
  if (!isWhole || total < 1 || total > MOST_FAULTS) {
    return problem('bad-request', `Ask for at least one fault and for at most ${MOST_FAULTS}.`)
  }
  const active = rulesOfLine(exercise, ruleSet)
  const wanted: WantedFault[] = []
  for (const { rule: id, times, code } of faults) {
    const rule = findRule(id)
    if (!rule) return problem('rule-not-in-set', `There is no rule called ${id}.`, [id])
    if (rule.scope === 'cantus') {
      const message = `“${rule.explain.title}” speaks of the cantus, which is given; ask for a fault of the line.`
      return problem('rule-of-another-voice', message, [id])
    }
    if (code !== undefined && !(code in rule.explain.messages)) {
      return problem('bad-request', `“${rule.explain.title}” has nothing called ${code} to say.`, [id])
    }
    if (wanted.some((other) => other.active.rule.id === id)) {
      return problem('bad-request', `Ask for “${rule.explain.title}” once, with the number of times.`, [id])
    }
    const found = active.find((candidate) => candidate.rule.id === id)
    if (!found) {
      const message = `“${rule.explain.title}” is not among the rules of this set and species.`
      return problem('rule-not-in-set', message, [id])
    }
    wanted.push({ active: found, times, code })
  }
  return ok(wanted)
}

function walkWith(
  request: FaultRequest,
  wanted: readonly WantedFault[],
  apart: number,
  stray = 0,
  { without, limits }: Readonly<{ without?: RuleId; limits?: Limits }> = {},
): Walk {
  const { exercise, ruleSet } = request
  const active = rulesOfLine(exercise, ruleSet)
  const asked = new Set(wanted.map((fault) => fault.active.rule.id))
  const laws = active.filter(({ rule }) => !asked.has(rule.id) && rule.id !== without)
  const places = placesOf(request, active, stray)
  const world = createWorld(exercise, laws, places)
  return walkAll(world, [createFaultAutomaton(wanted, apart, exercise, places)], limits)
}

/** The places of a whole line, with notes a little outside the compass where the line has to go astray. */
function placesOf({ exercise, compass }: FaultRequest, active: readonly ActiveRule[], stray: number): Places {
  const inside = poolOf(exercise, active, compass)
  const lowest = inside[0]
  const highest = inside.at(-1)
  const pool =
    stray > 0 && lowest && highest
      ? poolOf(exercise, active, {
          lowest: naturalNear(diatonicNumber(lowest) - stray),
          highest: naturalNear(diatonicNumber(highest) + stray),
        })
      : inside
  const tried = pool.map((pitch) => ({ pitch, isForeign: false }))
  const bars = exercise.cantus.map((_, index) => index + 1)
  const last = bars.length - 1
  return createPlaces(
    exercise,
    bars,
    (index) =>
      rhythmsOf(exercise.species, {
        isFirst: index === 0,
        isPenultimate: index === last - 1,
        isLast: index === last,
      }),
    () => tried,
  )
}

function naturalNear(steps: number): string {
  const inside = Math.min(7 * HIGHEST_OCTAVE + 6, Math.max(0, steps))
  return formatPitch({ letter: LETTERS[inside % 7] as Letter, alteration: 0, octave: Math.floor(inside / 7) })
}

/** The faults of a line as the checker finds them; `null` when they are not exactly those asked for, so far apart. */
function readAnswerKey(
  checker: Checker,
  line: Line,
  faults: readonly Fault[],
  apart: number,
): readonly Finding[] | null {
  const findings = checker.checkLine(line)
  const isAsked = ({ ruleId, isRemark }: Finding) => !isRemark && faults.some(({ rule }) => rule === ruleId)
  const answerKey = findings.filter(isAsked)
  const isClean = findings.every((finding) => finding.level !== 'law' || isAsked(finding))
  const isCounted = faults.every(
    ({ rule, times, code }) =>
      answerKey.filter(({ ruleId }) => ruleId === rule).length === times &&
      answerKey.every((finding) => finding.ruleId !== rule || code === undefined || finding.code === code),
  )
  const ends = answerKey.map(({ bars }) => bars.at(-1) ?? 0)
  const isApart = ends.every((end, index) => index === 0 || end - (ends[index - 1] as number) >= apart)
  return isClean && isCounted && isApart ? answerKey : null
}

/** Why there is no such line: which fault cannot be alone, and which other laws it always breaks with it. */
function explain(
  request: FaultRequest,
  wanted: readonly WantedFault[],
  walk: Walk,
  apart: number,
): Result<never, GenerationProblem> {
  const titles = wanted.map(({ active }) => `“${active.rule.explain.title}”`)
  const rules = wanted.map(({ active }) => active.rule.id)
  if (!walk.isExact) {
    return problem('not-found', `No line with ${list(titles)} broken was found in the time given.`, rules)
  }
  for (const fault of wanted) {
    const alone = { ...fault, times: 1 }
    const { count, isExact } = walkWith(request, [alone], 0, STRAY_STEPS)
    if (count > 0n) continue
    if (isExact) return explainAlone(request, alone)
    return problem('not-found', `No line with ${list(titles)} broken was found in the time given.`, rules)
  }
  const times = wanted.reduce((sum, fault) => sum + fault.times, 0)
  const message = `${list(titles)} cannot be broken ${times} times in ${request.exercise.cantus.length} bars, ${apart} bars apart, without another breach.`
  return problem('impossible-together', message, rules)
}

function explainAlone(request: FaultRequest, fault: WantedFault): Result<never, GenerationProblem> {
  const { rule } = fault.active
  const companions = rulesOfLine(request.exercise, request.ruleSet)
    .filter(({ level, rule: other }) => level === 'law' && other.id !== rule.id)
    .filter(({ rule: other }) => {
      const short = { without: other.id, limits: SHORT_LIMITS }
      return walkWith(request, [fault], 0, STRAY_STEPS, short).count > 0n
    })
  const others = companions.map((companion) => `“${companion.rule.explain.title}”`)
  const reason =
    others.length > 0
      ? `it always comes with a breach of ${list(others, 'or')}`
      : 'it always comes with other breaches, or cannot be broken here at all'
  return problem(
    'impossible',
    `“${rule.explain.title}” cannot be broken alone over this cantus: ${reason}.`,
    [rule.id, ...companions.map((companion) => companion.rule.id)],
  )
}

const list = (names: readonly string[], joint = 'and'): string =>
  names.length < 2 ? (names[0] ?? '') : `${names.slice(0, -1).join(', ')} ${joint} ${names.at(-1)}`
