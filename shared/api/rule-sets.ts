import { z } from 'zod'
import { ruleSetFileSchema, ruleSettingsSchema, writtenRuleSet } from '@/shared/rule-sets/rule-set-file'
import { endpoint } from './endpoint'
import { idSchema, ruleSetNameSchema } from './fields'

export const ruleSetBodySchema = z.strictObject({
  ...writtenRuleSet,
  /** Course it is shared with, or null to keep it to oneself. */
  courseId: idSchema.nullable().default(null),
})
export type RuleSetBody = z.output<typeof ruleSetBodySchema>

const summary = {
  id: idSchema,
  name: ruleSetNameSchema,
  basedOn: z.string().nullable(),
  courseId: idSchema.nullable(),
  isMine: z.boolean(),
  updatedAt: z.string(),
}

/** A rule set in a list: how many rules stand at each level, without the rules themselves. */
export const ruleSetSummarySchema = z.strictObject({
  ...summary,
  laws: z.int().min(0),
  preferences: z.int().min(0),
})
export type RuleSetSummary = z.infer<typeof ruleSetSummarySchema>

export const keptRuleSetSchema = z.strictObject({ ...summary, rules: ruleSettingsSchema })
export type KeptRuleSet = z.infer<typeof keptRuleSetSchema>

const reply = z.strictObject({ ruleSet: keptRuleSetSchema })

export const ruleSets = {
  /** One's own, and those shared with a course that one teaches in. */
  list: endpoint({
    method: 'GET',
    path: '/api/rule-sets',
    reply: z.strictObject({ ruleSets: z.array(ruleSetSummarySchema) }),
  }),
  get: endpoint({ method: 'GET', path: '/api/rule-sets/:ruleSetId', reply }),
  create: endpoint({ method: 'POST', path: '/api/rule-sets', body: ruleSetBodySchema, reply }),
  /** Makes one's own out of a file; it is not shared yet. */
  import: endpoint({ method: 'POST', path: '/api/rule-sets/import', body: ruleSetFileSchema, reply }),
  update: endpoint({ method: 'PATCH', path: '/api/rule-sets/:ruleSetId', body: ruleSetBodySchema, reply }),
  remove: endpoint({ method: 'DELETE', path: '/api/rule-sets/:ruleSetId', reply: z.strictObject({}) }),
}
