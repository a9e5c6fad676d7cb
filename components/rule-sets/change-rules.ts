import type { Level, RuleId, RuleSet } from '@/shared/rules'

type Rules = RuleSet['rules']

const isSameParams = (a: unknown, b: unknown): boolean => JSON.stringify(a ?? {}) === JSON.stringify(b ?? {})

/** Rules whose level or parameters are not those they were. A rule left out is off. */
export const changedRules = (rules: Rules, before: Rules): readonly RuleId[] =>
  [...new Set([...Object.keys(rules), ...Object.keys(before)])].filter((id) => {
    const [now, then] = [rules[id], before[id]]
    return (
      (now?.level ?? 'off') !== (then?.level ?? 'off') ||
      (now !== undefined && !isSameParams(now.params, then?.params))
    )
  })

export const withRuleLevel = (rules: Rules, ruleId: RuleId, level: Level): Rules => ({
  ...rules,
  [ruleId]: { ...rules[ruleId], level },
})

export function withRuleParam(rules: Rules, ruleId: RuleId, name: string, value: unknown): Rules {
  const before = rules[ruleId] ?? { level: 'off' as const }
  return { ...rules, [ruleId]: { ...before, params: { ...before.params, [name]: value } } }
}

/** The rules as they are kept: without empty sets of parameters. */
export const tidyRules = (rules: Rules): Rules =>
  Object.fromEntries(
    Object.entries(rules).map(([id, { level, params }]) => [
      id,
      params && Object.keys(params).length > 0 ? { level, params } : { level },
    ]),
  )
