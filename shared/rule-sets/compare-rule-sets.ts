import { findRule, RULES, type AnyRule, type Level, type RuleId, type RuleSet } from '@/shared/rules'

type Params = Readonly<Record<string, unknown>>

/** A rule as one set has it: its level, and all its parameters, those left out by their defaults. */
export type Standing = Readonly<{ level: Level; params: Params }>

/** A rule that two sets have differently. `params` names the parameters that differ; none matter where both have it off. */
export type RuleDifference = Readonly<{
  ruleId: RuleId
  standings: readonly [Standing, Standing]
  params: readonly string[]
}>

/** How a rule stands in a set. Parameters that cannot be read are given as they are written. */
export function standingOf(rule: AnyRule, ruleSet: RuleSet): Standing {
  const setting = ruleSet.rules[rule.id]
  const parsed = rule.params.safeParse(setting?.params ?? {})
  return {
    level: setting?.level ?? 'off',
    params: parsed.success ? (parsed.data as Params) : (setting?.params ?? {}),
  }
}

const isSame = (a: unknown, b: unknown): boolean => JSON.stringify(a) === JSON.stringify(b)

/** The rules that two sets have differently, in the order of the catalogue. */
export const compareRuleSets = (a: RuleSet, b: RuleSet): readonly RuleDifference[] =>
  RULES.flatMap((rule): readonly RuleDifference[] => {
    const standings = [standingOf(rule, a), standingOf(rule, b)] as const
    const [one, other] = standings
    if (one.level === 'off' && other.level === 'off') return []
    const isOffInOne = one.level === 'off' || other.level === 'off'
    const params = isOffInOne
      ? []
      : Object.keys({ ...one.params, ...other.params }).filter(
          (name) => !isSame(one.params[name], other.params[name]),
        )
    return one.level === other.level && params.length === 0 ? [] : [{ ruleId: rule.id, standings, params }]
  })

/** Rules that a set holds and nobody knows: of a later catalogue, or misspelt. */
export const unknownRules = ({ rules }: RuleSet): readonly RuleId[] =>
  Object.keys(rules).filter((id) => findRule(id) === null)
