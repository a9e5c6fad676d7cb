import { z } from 'zod'
import { PRESETS, RULES } from '@/shared/rules'
import { ruleSetFileSchema } from './rule-set-file'

type JsonSchema = Readonly<Record<string, unknown>>

/** The default values stand in the schema; `$schema` of a part would be a second root. */
const partOf = (schema: z.ZodType): JsonSchema => {
  const { $schema: _, ...part } = z.toJSONSchema(schema, { io: 'input', unrepresentable: 'any' })
  return part
}

/**
 * The published JSON Schema (draft 2020-12) of a rule set file: made from the file's own schema, with every rule of the
 * catalogue and its parameters written out, so that an editor can complete them.
 */
export function createRuleSetJsonSchema(id: string): JsonSchema {
  const file = z.toJSONSchema(ruleSetFileSchema, { io: 'input' }) as JsonSchema & {
    properties: Record<string, JsonSchema>
  }
  const rules = Object.fromEntries(
    RULES.map((rule) => [
      rule.id,
      {
        type: 'object',
        title: rule.explain.title,
        description: rule.explain.statement,
        properties: {
          level: { enum: ['law', 'preference', 'off'] },
          params: partOf(rule.params),
        },
        required: ['level'],
        additionalProperties: false,
      },
    ]),
  )
  return {
    ...file,
    $id: id,
    title: 'A rule set of counterpoint',
    description: `Which rules are law, which are preference, and their parameters. The presets are ${PRESETS.map(({ id: preset }) => preset).join(', ')}.`,
    properties: {
      ...file.properties,
      basedOn: {
        anyOf: [{ enum: PRESETS.map(({ id: preset }) => preset) }, { type: 'null' }],
        default: null,
      },
      rules: { type: 'object', properties: rules, additionalProperties: false },
    },
  }
}
