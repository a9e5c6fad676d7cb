import { callApi, type Refusal } from '@/components/api'
import { api } from '@/shared/api'
import type { KeptRuleSet } from '@/shared/api/rule-sets'
import { ok, type Result } from '@/shared/result'
import { findPreset, type RuleSet } from '@/shared/rules'

/** A rule set by its id: a preset, which is nobody's, or one that a teacher keeps. */
export type FoundRuleSet = Readonly<{ ruleSet: RuleSet; kept: KeptRuleSet | null }>

export const toRuleSet = ({ id, name, rules }: KeptRuleSet): RuleSet => ({ id, name, rules })

export async function fetchRuleSet(id: string): Promise<Result<FoundRuleSet, Refusal>> {
  const preset = findPreset(id)
  if (preset) return ok({ ruleSet: preset, kept: null })
  const result = await callApi(api.ruleSets.get, { params: { ruleSetId: id } })
  if (!result.ok) return result
  const { ruleSet: kept } = result.value
  return ok({ ruleSet: toRuleSet(kept), kept })
}
