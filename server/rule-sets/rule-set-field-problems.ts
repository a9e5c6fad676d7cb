import type { FieldProblem } from '@/shared/api/errors'
import { MAX_PROBLEMS_TOLD } from '@/shared/api/field-problems'
import type { RuleSetBody } from '@/shared/api/rule-sets'
import { findPreset, ruleSetProblems } from '@/shared/rules'

/** What keeps a rule set from being used: rules nobody knows, parameters out of range, a preset that does not exist. */
export function ruleSetFieldProblems({
  name,
  basedOn,
  rules,
}: Pick<RuleSetBody, 'name' | 'basedOn' | 'rules'>): readonly FieldProblem[] {
  const origin: readonly FieldProblem[] =
    basedOn === null || findPreset(basedOn) ? [] : [{ path: 'basedOn', code: 'not-an-option' }]
  const inRules = ruleSetProblems({ id: 'asked', name, rules }).map(
    ({ ruleId, code, path }): FieldProblem => ({
      path: `rules.${ruleId}${code === 'bad-params' ? `.params${path ? `.${path}` : ''}` : ''}`.slice(0, 100),
      code,
    }),
  )
  return [...origin, ...inRules].slice(0, MAX_PROBLEMS_TOLD)
}
