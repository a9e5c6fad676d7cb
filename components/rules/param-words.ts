import { paramFields } from '@/components/rule-sets/params-fields'
import type { Words } from '@/components/words'
import type { AnyRule } from '@/shared/rules'
import type { Standing } from '@/shared/rule-sets/compare-rule-sets'

/** A parameter's value as a sentence has it: `yes`, `5`, `upper step and either step`. */
export function valueInWords(value: unknown, words: Words): string {
  if (typeof value === 'boolean') return value ? words.rules.yes : words.rules.no
  if (Array.isArray(value))
    return value.length === 0
      ? words.rules.nothing
      : words.lesson.listed(value.map((each) => valueInWords(each, words)))
  if (typeof value === 'string') return value.replaceAll('-', ' ')
  if (value === null || value === undefined) return words.rules.nothing
  return typeof value === 'object' ? JSON.stringify(value) : String(value)
}

/** Named parameters of a rule with their values: `max: 10, max repeats: 2`. */
export const paramsInWords = (
  params: Standing['params'],
  names: readonly string[],
  rule: AnyRule,
  words: Words,
): string =>
  paramFields(rule.params)
    .filter(({ name }) => names.includes(name))
    .map(({ name, label }) => words.rules.setting(label, valueInWords(params[name], words)))
    .join(', ')
