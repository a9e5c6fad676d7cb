import type { z } from 'zod'
import type { FieldProblem } from '@/shared/api/errors'

/**
 * Judges a form by the very schema the server will use, before it is sent: the first problem of each field, by the code
 * that the schema's messages are. Empty when it would be taken.
 */
export function firstProblems(schema: z.ZodType, body: unknown): readonly FieldProblem[] {
  const parsed = schema.safeParse(body)
  if (parsed.success) return []
  const found = new Map<string, FieldProblem>()
  for (const issue of parsed.error.issues) {
    const path = issue.path.join('.')
    if (found.has(path)) continue
    const limits = issue as { maximum?: number | bigint; minimum?: number | bigint }
    const args = {
      ...(limits.maximum === undefined ? {} : { max: Number(limits.maximum) }),
      ...(limits.minimum === undefined ? {} : { min: Number(limits.minimum) }),
    }
    found.set(path, { path, code: issue.message, args })
  }
  return [...found.values()]
}
