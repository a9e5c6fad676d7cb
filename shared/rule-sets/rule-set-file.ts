import { z } from 'zod'
import { ruleSetNameSchema } from '@/shared/api/fields'
import type { RuleSet } from '@/shared/rules'
import { ruleSettingSchema } from '@/shared/wire/documents'

/** Where the published schema of a rule set file is served. */
export const RULE_SET_SCHEMA_PATH = '/schemas/rule-set.json'
/** More than the catalogue holds; a stop to bodies that are no rule set. */
const MAX_RULES = 400

/** Rules by id, each with its level and the parameters that differ from the rule's own defaults. A rule left out is off. */
export const ruleSettingsSchema = z
  .record(z.string().max(60), ruleSettingSchema)
  .refine((rules) => Object.keys(rules).length <= MAX_RULES, 'too-long')
export type RuleSettings = z.output<typeof ruleSettingsSchema>

/** What a rule set is written as: kept in the database so, and exported and imported as JSON. */
export const writtenRuleSet = {
  name: ruleSetNameSchema,
  /** The preset it was started from, by its id; null for one that was made from nothing. */
  basedOn: z.string().min(1).max(60).nullable().default(null),
  rules: ruleSettingsSchema,
}

/** The rules of a set as they are kept. Rules were read from JSON, or are our own plain data; the type alone forgets it. */
export const settingsOf = (rules: RuleSet['rules']): RuleSettings => rules as RuleSettings

/** A rule set as a file. */
export const ruleSetFileSchema = z.strictObject({
  $schema: z.string().max(300).optional(),
  /** Counts changes of this form that older readers could not read. */
  version: z.literal(1),
  ...writtenRuleSet,
})
export type RuleSetFile = z.output<typeof ruleSetFileSchema>

/** The file of a rule set; `origin` is where the schema is served, such as `https://board.school.example`. */
export const createRuleSetFile = (
  { name, basedOn, rules }: Readonly<{ name: string; basedOn: string | null; rules: RuleSettings }>,
  origin: string,
): RuleSetFile => ({ $schema: `${origin}${RULE_SET_SCHEMA_PATH}`, version: 1, name, basedOn, rules })
