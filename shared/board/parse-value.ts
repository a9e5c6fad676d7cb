import type * as Y from 'yjs'
import type { z } from 'zod'
import { MAX_BARS } from '@/shared/wire/documents'

const parsedBySchema = new WeakMap<z.ZodType, WeakMap<object, unknown>>()

/**
 * The value if its schema takes it, else null. A document hands out the same object until the key is written again, so
 * what was parsed once is remembered: a chorus of thousands is read in less than a millisecond.
 */
export function parseValue<Schema extends z.ZodType>(schema: Schema, value: unknown): z.infer<Schema> | null {
  if (typeof value !== 'object' || value === null) return null
  let known = parsedBySchema.get(schema)
  if (!known) parsedBySchema.set(schema, (known = new WeakMap()))
  const remembered = known.get(value)
  if (remembered !== undefined) return remembered as z.infer<Schema> | null
  const parsed = schema.safeParse(value)
  const result = parsed.success ? parsed.data : null
  known.set(value, result)
  return result
}

const BAR_GRAMMAR = /^[1-9][0-9]?$/

/** Reads a bar number as keys carry it; null for anything else. */
export function parseBar(text: string): number | null {
  if (!BAR_GRAMMAR.test(text)) return null
  const bar = Number(text)
  return bar <= MAX_BARS ? bar : null
}

/** The values of a root map that parse, by key. Keys that hold something else are passed over. */
export function readEntries<Schema extends z.ZodType>(
  doc: Y.Doc,
  map: string,
  schema: Schema,
): readonly (readonly [key: string, value: z.infer<Schema>])[] {
  const entries: [string, z.infer<Schema>][] = []
  for (const [key, raw] of doc.getMap<unknown>(map)) {
    const value = parseValue(schema, raw)
    if (value !== null) entries.push([key, value])
  }
  return entries
}

/** As `readEntries`, for maps whose keys are bar numbers. */
export function readBars<Schema extends z.ZodType>(
  doc: Y.Doc,
  map: string,
  schema: Schema,
): Record<number, z.infer<Schema>> {
  const bars: Record<number, z.infer<Schema>> = {}
  for (const [key, value] of readEntries(doc, map, schema)) {
    const bar = parseBar(key)
    if (bar !== null) bars[bar] = value
  }
  return bars
}
