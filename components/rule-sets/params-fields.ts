import { z } from 'zod'

/** One parameter of a rule as a plain control. */
export type ParamField = Readonly<{
  name: string
  /** The name in words: `maxRepeats` reads `max repeats`. */
  label: string
  description: string | null
  control:
    | { kind: 'whole-number'; min: number | null; max: number | null }
    | { kind: 'number'; min: number | null; max: number | null }
    | { kind: 'switch' }
    | { kind: 'choice'; options: readonly string[] }
    | { kind: 'list'; options: readonly string[] | null }
    | { kind: 'text' }
    | { kind: 'json' }
  fallback: unknown
}>

type JsonSchema = Readonly<{
  type?: string
  enum?: readonly unknown[]
  const?: unknown
  anyOf?: readonly JsonSchema[]
  minimum?: number
  maximum?: number
  exclusiveMinimum?: number
  items?: JsonSchema
  default?: unknown
  description?: string
  properties?: Readonly<Record<string, JsonSchema>>
}>

/** A parameter's name in words. */
export const inWords = (name: string): string =>
  name.replace(/([a-z0-9])([A-Z])/g, (_, before: string, after: string) => `${before} ${after.toLowerCase()}`)

/** The strings a schema allows, or null when it is not a closed choice of strings. */
function choices(schema: JsonSchema): readonly string[] | null {
  const values =
    schema.enum ??
    (schema.anyOf?.every((one) => 'const' in one) ? schema.anyOf.map((one) => one.const) : null)
  return values?.every((value): value is string => typeof value === 'string') ? values : null
}

// zod writes the safe-integer bounds for a number that has none of its own.
const bound = (value: number | undefined): number | null =>
  value === undefined || Math.abs(value) >= Number.MAX_SAFE_INTEGER ? null : value

function controlOf(schema: JsonSchema): ParamField['control'] {
  const options = choices(schema)
  if (options) return { kind: 'choice', options }
  switch (schema.type) {
    case 'boolean':
      return { kind: 'switch' }
    case 'integer':
      return { kind: 'whole-number', min: bound(schema.minimum), max: bound(schema.maximum) }
    case 'number':
      return { kind: 'number', min: bound(schema.minimum), max: bound(schema.maximum) }
    case 'array':
      return schema.items?.type === 'string'
        ? { kind: 'list', options: choices(schema.items) }
        : { kind: 'json' }
    case 'string':
      return { kind: 'text' }
    default:
      return { kind: 'json' }
  }
}

/** The controls for a rule's parameters, made from its schema. A rule without parameters has none. */
export function paramFields(params: z.ZodType): readonly ParamField[] {
  const schema = z.toJSONSchema(params, { io: 'input', unrepresentable: 'any' }) as JsonSchema
  const defaults = params.safeParse({})
  const fallbacks = (defaults.success ? defaults.data : {}) as Readonly<Record<string, unknown>>
  return Object.entries(schema.properties ?? {}).map(([name, property]) => ({
    name,
    label: inWords(name),
    description: property.description ?? null,
    control: controlOf(property),
    fallback: fallbacks[name],
  }))
}

/** How a value stands in a control that is typed into. */
export function formatParam(control: ParamField['control'], value: unknown): string {
  if (control.kind === 'list' && Array.isArray(value)) return value.join(', ')
  if (control.kind === 'json') return JSON.stringify(value)
  return value === null || value === undefined ? '' : String(value)
}

/** Reads what was typed into a control; undefined when it cannot be what the control holds. */
export function parseParam(control: ParamField['control'], text: string): unknown {
  const trimmed = text.trim()
  switch (control.kind) {
    case 'whole-number':
      return /^-?\d+$/.test(trimmed) ? Number(trimmed) : undefined
    case 'number':
      return /^-?\d+(\.\d+)?$/.test(trimmed) ? Number(trimmed) : undefined
    case 'switch':
      return trimmed === 'true'
    case 'list':
      return trimmed === '' ? [] : trimmed.split(/[\s,;]+/).filter((part) => part !== '')
    case 'json':
      try {
        return JSON.parse(trimmed) as unknown
      } catch {
        return undefined
      }
    default:
      return trimmed
  }
}
