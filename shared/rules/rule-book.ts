import { RULES } from '@/shared/rules/registry'
import type { Explanation, Level, RuleId, Scope, Species } from '@/shared/rules/rule'

/** All that a reader is told of a rule, as plain data. */
export type RulePage = Explanation &
  Readonly<{
    id: RuleId
    level: Exclude<Level, 'off'>
    scope: Scope
    species: readonly Species[]
  }>

/** The pages of every rule, by id, in the order of the registry. */
export type RuleBook = Readonly<Record<RuleId, RulePage>>

/**
 * The whole book. Browsers have it as a chunk of its own, made beforehand: there the rules' own explanations hold only
 * what words a finding. Load it by `useRuleBook`.
 */
export const RULE_BOOK: RuleBook = Object.fromEntries(
  RULES.map(({ id, level, scope, species, explain }) => [
    id,
    { id, level, scope, species: [...species], ...explain },
  ]),
)
