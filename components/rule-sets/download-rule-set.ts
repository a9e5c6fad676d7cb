import { createRuleSetFile, settingsOf } from '@/shared/rule-sets/rule-set-file'
import type { RuleSet } from '@/shared/rules'
import { tidyRules } from './change-rules'

/** The file's name: letters and figures of the rule set's own, `term-one.rules.json`. */
export const fileNameOf = (name: string): string => {
  const plain = name
    .normalize('NFKD')
    .replace(/[\u0300-\u036f]/g, '')
    .toLowerCase()
    .replace(/[^a-z0-9]+/g, '-')
    .replace(/^-|-$/g, '')
  return `${plain || 'rule-set'}.rules.json`
}

/** Hands a rule set to the browser as a file to be kept. */
export function downloadRuleSet(ruleSet: RuleSet, basedOn: string | null): void {
  const { name, rules } = ruleSet
  const file = createRuleSetFile(
    { name, basedOn, rules: settingsOf(tidyRules(rules)) },
    window.location.origin,
  )
  const url = URL.createObjectURL(
    new Blob([`${JSON.stringify(file, null, 2)}\n`], { type: 'application/json' }),
  )
  const link = document.createElement('a')
  link.href = url
  link.download = fileNameOf(name)
  link.click()
  URL.revokeObjectURL(url)
}
