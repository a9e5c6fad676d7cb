import {
  findRule,
  readExercise,
  type AnyRule,
  type Position,
  type RuleId,
  type RuleSet,
  type Species,
} from '@/shared/rules'
import { createSearch } from '@/shared/search'
import { comparePitches, parsePitch } from '@/shared/theory/pitch'
import { standingOf } from './compare-rule-sets'

/** What a rule set asks for that cannot be had together. */
export type Conflict = Readonly<
  | {
      /** A least that is greater than its most. */
      kind: 'crossed-bounds'
      ruleId: RuleId
      low: string
      high: string
    }
  | {
      /** A law that names what is allowed, and allows nothing. */
      kind: 'nothing-allowed'
      ruleId: RuleId
    }
  | {
      /** The laws together leave no line over or under the plainest cantus: the bar where it stops, and which of them refuse it. */
      kind: 'no-line'
      position: Position
      bar: number
      rules: readonly RuleId[]
    }
>

/** Parameters that bound the same thing from below and from above, by the names that rules give them. */
const BOUNDS: readonly (readonly [low: string, high: string])[] = [
  ['least', 'most'],
  ['min', 'max'],
  ['low', 'high'],
  ['aboveLow', 'aboveHigh'],
  ['belowLow', 'belowHigh'],
]

/**
 * The first cantus of Fux's Gradus ad Parnassum (1725): whatever rule set a class works by, something can be written to
 * it. Its own solutions are Fux's figures 5 and 6.
 */
const PLAIN_CANTUS = {
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'],
  mode: 'dorian',
  final: 'D',
} as const

/** More than the presets need by far; past it nothing is claimed. */
const MOST_NODES = 60_000

function isCrossed(low: unknown, high: unknown): boolean {
  if (typeof low === 'number' && typeof high === 'number') return low > high
  if (typeof low !== 'string' || typeof high !== 'string') return false
  const [from, to] = [parsePitch(low), parsePitch(high)]
  return from.ok && to.ok && comparePitches(from.value, to.value) > 0
}

/** True where lists say what is allowed (they are not empty by default), and every list is empty. */
function allowsNothing(params: Readonly<Record<string, unknown>>, defaults: unknown): boolean {
  const lists = Object.entries(defaults as Readonly<Record<string, unknown>>).filter(([, value]) =>
    Array.isArray(value),
  )
  return (
    lists.some(([, value]) => (value as readonly unknown[]).length > 0) &&
    lists.every(([name]) => {
      const given = params[name]
      return Array.isArray(given) && given.length === 0
    })
  )
}

/**
 * True where a law by itself leaves no line over or under the plainest cantus, in the first of its species. An empty list
 * may also mean that nothing is asked for, as where a close has no formula of its own.
 */
function leavesNothing({ id, species }: AnyRule, params: Readonly<Record<string, unknown>>): boolean {
  const alone: RuleSet = { id, name: id, rules: { [id]: { level: 'law', params } } }
  const first = [...species].sort()[0]
  return (
    first !== undefined &&
    (['above', 'below'] as const).some((position) => noLine(alone, position, first) !== null)
  )
}

/** Contradictions within single rules. Rules that are off contradict nothing. */
function conflictsInRules(ruleSet: RuleSet): readonly Conflict[] {
  return Object.keys(ruleSet.rules).flatMap((ruleId): readonly Conflict[] => {
    const rule = findRule(ruleId)
    if (!rule) return []
    const { level, params } = standingOf(rule, ruleSet)
    if (level === 'off') return []
    const crossed = BOUNDS.filter(([low, high]) => isCrossed(params[low], params[high])).map(
      ([low, high]): Conflict => ({ kind: 'crossed-bounds', ruleId, low, high }),
    )
    const isEmpty =
      level === 'law' && allowsNothing(params, rule.params.parse({})) && leavesNothing(rule, params)
    return isEmpty ? [...crossed, { kind: 'nothing-allowed', ruleId }] : crossed
  })
}

/** What the laws leave of the plainest exercise; null where a line can be written, or it is not known. */
function noLine(ruleSet: RuleSet, position: Position, species: Species): Conflict | null {
  const exercise = readExercise({ ...PLAIN_CANTUS, position, species })
  const { deadEnd } = createSearch(exercise, ruleSet, { limits: { nodes: MOST_NODES } }).find()
  return deadEnd && { kind: 'no-line', position, bar: deadEnd.bar, rules: deadEnd.rules }
}

/** Everything about a rule set that contradicts itself, as far as it can be told without a score. */
export function findConflicts(ruleSet: RuleSet): readonly Conflict[] {
  const inRules = conflictsInRules(ruleSet)
  const together = (['above', 'below'] as const).flatMap((position) => noLine(ruleSet, position, 1) ?? [])
  return [...inRules, ...together]
}
