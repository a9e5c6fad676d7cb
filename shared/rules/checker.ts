import { isWhollyWritten, readCantus, readMoments, readVoice, type SetAside } from '@/shared/rules/reading'
import { resolveRuleSet, rulesInForce, type ActiveRule } from '@/shared/rules/rule-set'
import type { Breach, Exercise, Finding, Moment, RuleSet, Scope, Step, Voice } from '@/shared/rules/rule'
import type { BarNotes, Line } from '@/shared/theory/note'

/** Notes offered for some bars of a line, by bar: one member's proposal, or one note tried on the ladder. */
export type Proposal = Readonly<Record<number, BarNotes>>

/**
 * A rule set made ready for one exercise: parameters read and rules started once, so that judging a line costs only
 * the folds. Findings are in the order of the bars they end in.
 */
export type Checker = Readonly<{
  /** All that the rules have to say of a line, whole or partial. */
  checkLine: (line: Line, setAside?: SetAside) => readonly Finding[]
  /** All that the rules have to say of the cantus alone. */
  checkCantus: () => readonly Finding[]
  /**
   * Judges many proposals on one line: for each, the findings on the line with it in place that point at one of its
   * bars. Reads only what each proposal changes, and equal proposals once.
   */
  annotate: (
    line: Line,
    proposals: readonly Proposal[],
    setAside?: SetAside,
  ) => readonly (readonly Finding[])[]
}>

/** One rule, started. States are values: a fold may be taken up again from any of them. */
type Runner = Readonly<{
  ruleId: string
  level: Finding['level']
  voice: Voice
  readsPair: boolean
  /** Moments back that the rule remembers; `Infinity` for the whole line. */
  reach: number
  params: unknown
  start: unknown
  step: (state: unknown, moment: Moment, params: unknown) => Step<unknown>
  finish: (state: unknown, params: unknown, isComplete: boolean) => Breach | null
}>

/** The two readings of a line that rules fold over. */
type Readings = Readonly<{
  pair: readonly Moment[]
  solo: readonly Moment[]
  isComplete: boolean
  hasRest: boolean
}>

const SCOPES_OF_LINE: readonly Scope[] = ['melody', 'line', 'pair']
const SCOPES_OF_CANTUS: readonly Scope[] = ['melody', 'cantus']

export function createChecker(exercise: Exercise, ruleSet: RuleSet): Checker {
  const { active } = resolveRuleSet(ruleSet)
  const lineRunners = startRules(active, SCOPES_OF_LINE, exercise, 'line')
  const cantusRunners = startRules(active, SCOPES_OF_CANTUS, exercise, 'cantus')

  const readLine = (line: Line, setAside?: SetAside): Readings => {
    const pair = readMoments(exercise, line, setAside)
    const solo = readVoice(exercise.cantus.length, line, setAside)
    return { pair, solo, isComplete: isWhollyWritten(pair), hasRest: hasRest(pair) }
  }

  return {
    checkLine: (line, setAside) => runAll(lineRunners, readLine(line, setAside)),
    checkCantus: () => {
      const solo = readCantus(exercise.cantus)
      return runAll(cantusRunners, { pair: solo, solo, isComplete: true, hasRest: false })
    },
    annotate: (line, proposals, setAside) => {
      const readings = readLine(line, setAside)
      const traces = lineRunners.map((runner) => traceRule(runner, readings))
      const known = new Map<string, readonly Finding[]>()
      return proposals.map((proposal) => {
        const name = nameProposal(proposal)
        let findings = known.get(name)
        if (!findings) {
          const changed = readLine({ ...line, ...proposal }, setAside)
          findings = sortFindings(rerunAll(lineRunners, traces, readings, changed, barsOf(proposal)))
          known.set(name, findings)
        }
        return findings
      })
    },
  }
}

/** Judges a line, whole or partial, by every rule of a set. For many lines of one exercise, create a checker. */
export const checkLine = (
  exercise: Exercise,
  line: Line,
  ruleSet: RuleSet,
  { setAside }: Readonly<{ setAside?: SetAside }> = {},
): readonly Finding[] => createChecker(exercise, ruleSet).checkLine(line, setAside)

/** Judges the cantus of an exercise by the rules that govern a cantus and any melody. */
export const checkCantus = (exercise: Exercise, ruleSet: RuleSet): readonly Finding[] =>
  createChecker(exercise, ruleSet).checkCantus()

function startRules(
  active: readonly ActiveRule[],
  scopes: readonly Scope[],
  exercise: Exercise,
  voice: Voice,
): readonly Runner[] {
  const inForce = voice === 'cantus' ? active : rulesInForce(active, exercise.species)
  return inForce
    .filter(({ rule }) => scopes.includes(rule.scope))
    .map(({ rule, level, params }) => ({
      ruleId: rule.id,
      level,
      voice,
      readsPair: rule.scope === 'pair',
      reach: rule.reach ?? Infinity,
      params,
      start: rule.start(exercise, params, voice) as unknown,
      step: rule.step,
      finish: rule.finish,
    }))
}

function findingOf({ ruleId, level, voice }: Runner, breach: Breach): Finding {
  const { code, bars, notes, args } = breach
  return breach.isRemark
    ? { ruleId, level: 'preference', voice, code, bars, notes, args, isRemark: true }
    : { ruleId, level, voice, code, bars, notes, args }
}

function runAll(runners: readonly Runner[], { pair, solo, isComplete }: Readings): readonly Finding[] {
  const findings: Finding[] = []
  for (const runner of runners) {
    const moments = runner.readsPair ? pair : solo
    const { step, params } = runner
    let state = runner.start
    for (let index = 0; index < moments.length; index += 1) {
      const next = step(state, moments[index] as Moment, params)
      state = next.state
      if (next.breach !== null) findings.push(findingOf(runner, next.breach))
    }
    const last = runner.finish(state, params, isComplete)
    if (last !== null) findings.push(findingOf(runner, last))
  }
  return sortFindings(findings)
}

/** A rule's whole run over a line: its state before each moment and after the last, and what it said at each. */
type Trace = Readonly<{
  states: readonly unknown[]
  breaches: readonly (Breach | null)[]
}>

function traceRule(runner: Runner, { pair, solo }: Readings): Trace {
  const states: unknown[] = [runner.start]
  const breaches: (Breach | null)[] = []
  for (const moment of runner.readsPair ? pair : solo) {
    const { state, breach } = runner.step(states.at(-1), moment, runner.params)
    states.push(state)
    breaches.push(breach)
  }
  return { states, breaches }
}

/**
 * Runs every rule again over a changed line, from the first moment that differs until it can remember nothing of the
 * change; from there on it would say what it said before. Keeps the findings that point at one of `bars`.
 */
function rerunAll(
  runners: readonly Runner[],
  traces: readonly Trace[],
  before: Readings,
  after: Readings,
  bars: ReadonlySet<number>,
): Finding[] {
  const findings: Finding[] = []
  const isPlain = !before.hasRest && !after.hasRest
  const pairSpan = changedSpan(before.pair, after.pair, isPlain)
  const soloSpan = changedSpan(before.solo, after.solo, isPlain)
  for (let place = 0; place < runners.length; place += 1) {
    const runner = runners[place] as Runner
    const { readsPair, step, params } = runner
    const trace = traces[place] as Trace
    const moments = readsPair ? after.pair : after.solo
    const { from, to } = readsPair ? pairSpan : soloSpan
    for (let index = 0; index < from; index += 1) keep(findings, runner, trace.breaches[index], bars)
    const stop = Math.min(to + runner.reach, moments.length)
    let state = trace.states[from]
    for (let index = from; index < stop; index += 1) {
      const next = step(state, moments[index] as Moment, params)
      state = next.state
      keep(findings, runner, next.breach, bars)
    }
    for (let index = stop; index < moments.length; index += 1) {
      keep(findings, runner, trace.breaches[index], bars)
    }
    const end = stop < moments.length ? trace.states[moments.length] : state
    keep(findings, runner, runner.finish(end, params, after.isComplete), bars)
  }
  return findings
}

function keep(
  findings: Finding[],
  runner: Runner,
  breach: Breach | null | undefined,
  bars: ReadonlySet<number>,
): void {
  if (breach === null || breach === undefined) return
  for (const bar of breach.bars) {
    if (bars.has(bar)) {
      findings.push(findingOf(runner, breach))
      return
    }
  }
}

/**
 * The first moment that differs, and the first after it from which both readings go on alike. Everything differs where
 * the readings have unlike lengths, or a rest (are not plain), over which rules look further back than they say.
 */
function changedSpan(
  before: readonly Moment[],
  after: readonly Moment[],
  isPlain: boolean,
): Readonly<{ from: number; to: number }> {
  if (before.length !== after.length || !isPlain) return { from: 0, to: after.length }
  let from = 0
  while (from < after.length && isSameMoment(after[from] as Moment, before[from] as Moment)) from += 1
  let to = after.length
  while (to > from && isSameMoment(after[to - 1] as Moment, before[to - 1] as Moment)) to -= 1
  return { from, to }
}

const hasRest = (moments: readonly Moment[]): boolean => moments.some(({ note }) => note === 'rest')

/** True of moments at one place of two readings of equal length; pitches of one name are one object. */
const isSameMoment = (a: Moment, b: Moment): boolean =>
  a.note === b.note &&
  a.bar === b.bar &&
  a.place === b.place &&
  a.ticks === b.ticks &&
  a.isStruck === b.isStruck

const barsOf = (proposal: Proposal): ReadonlySet<number> => new Set(Object.keys(proposal).map(Number))

function nameProposal(proposal: Proposal): string {
  let name = ''
  for (const bar in proposal) {
    name += `|${bar}`
    for (const { pitch, ticks, tied } of proposal[bar] as BarNotes) {
      name += ` ${pitch ?? 'r'}:${ticks}${tied ? '~' : ''}`
    }
  }
  return name
}

/** By the last bar a finding points at; within a bar the order of the rule set stays. */
const sortFindings = (findings: Finding[]): readonly Finding[] =>
  findings.length < 2 ? findings : findings.sort((a, b) => lastBarOf(a) - lastBarOf(b))

const lastBarOf = ({ bars }: Finding): number => bars[bars.length - 1] ?? 0
