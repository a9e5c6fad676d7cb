import { z } from 'zod'
import { fieldProblems, MAX_PROBLEMS_TOLD } from '@/shared/api/field-problems'

const problemsOf = (schema: z.ZodType, value: unknown) => {
  const parsed = schema.safeParse(value)
  return parsed.success ? [] : fieldProblems(parsed.error)
}

describe('the problems of a form', () => {
  it('have the schema’s own code where it has one, with its limits', () => {
    const schema = z.strictObject({ name: z.string().min(1, 'empty').max(3, 'too-long') })
    expect(problemsOf(schema, { name: 'long' })).toEqual([
      { path: 'name', code: 'too-long', args: { max: 3 } },
    ])
    expect(problemsOf(schema, { name: '' })).toEqual([{ path: 'name', code: 'empty', args: { min: 1 } }])
  })

  it('have a code by their kind where the schema says nothing', () => {
    const schema = z.strictObject({ a: z.enum(['x']), b: z.string(), c: z.array(z.string().regex(/^x$/)) })
    expect(problemsOf(schema, { a: 'y', c: ['x', 'z'], d: 1 })).toEqual([
      { path: 'a', code: 'not-an-option' },
      { path: 'b', code: 'missing' },
      { path: 'c.1', code: 'wrong-form' },
      { path: 'd', code: 'unknown-key' },
    ])
  })

  it('are never more, nor their paths longer, than is of use', () => {
    const many = Object.fromEntries(
      Array.from({ length: 500 }, (_, index) => [`${'k'.repeat(200)}${index}`, 1]),
    )
    const problems = problemsOf(z.strictObject({}), many)
    expect(problems).toHaveLength(MAX_PROBLEMS_TOLD)
    expect(Math.max(...problems.map(({ path }) => path.length))).toBeLessThanOrEqual(100)
  })
})
