import { findRule } from '@/shared/rules/registry'
import type { AnyRule, Finding, RuleId, RuleSet, Species } from '@/shared/rules/rule'

/** A rule of a set with its parameters read: what the checker runs. */
export type ActiveRule = Readonly<{ rule: AnyRule; level: Finding['level']; params: unknown }>

/** Why a rule set cannot be used as it stands. `path` names the parameter, `message` says what is wrong with it. */
export type RuleSetProblem = Readonly<{
  ruleId: RuleId
  code: 'unknown-rule' | 'bad-params'
  path: string
  message: string
}>

type Resolution = Readonly<{ active: readonly ActiveRule[]; problems: readonly RuleSetProblem[] }>

/**
 * Reads the parameters of every rule of a set by the rule's own schema. Rules that are off are read too, so that a
 * fault in them is told before they are switched on. Unknown rules and bad parameters are left out and told.
 */
export function resolveRuleSet(ruleSet: RuleSet): Resolution {
  const active: ActiveRule[] = []
  const problems: RuleSetProblem[] = []
  for (const [ruleId, setting] of Object.entries(ruleSet.rules)) {
    const rule = findRule(ruleId)
    if (!rule) {
      problems.push({ ruleId, code: 'unknown-rule', path: '', message: `There is no rule called ${ruleId}.` })
      continue
    }
    const parsed = rule.params.safeParse(setting.params ?? {})
    if (!parsed.success) {
      for (const { path, message } of parsed.error.issues) {
        problems.push({ ruleId, code: 'bad-params', path: path.join('.'), message })
      }
    } else if (setting.level !== 'off') {
      active.push({ rule, level: setting.level, params: parsed.data })
    }
  }
  return { active, problems }
}

/** The rules that judge a line in one species: those made for it, without those that another one of them suspends. */
export function rulesInForce(active: readonly ActiveRule[], species: Species): readonly ActiveRule[] {
  const ofSpecies = active.filter(({ rule }) => rule.species.has(species))
  const suspended = new Set(ofSpecies.flatMap(({ rule }) => [...(rule.suspends ?? [])]))
  return ofSpecies.filter(({ rule }) => !suspended.has(rule.id))
}

/** What is wrong with a rule set, in words; empty when it may be used. */
export const ruleSetProblems = (ruleSet: RuleSet): readonly RuleSetProblem[] =>
  resolveRuleSet(ruleSet).problems
