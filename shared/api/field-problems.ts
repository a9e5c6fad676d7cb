import type { z } from 'zod'
import type { FieldProblem } from './errors'

/** Codes for what a schema has no word of its own for, by zod's kind of issue. */
const CODES: Readonly<Record<string, string>> = {
  invalid_type: 'wrong-kind',
  invalid_value: 'not-an-option',
  invalid_format: 'wrong-form',
  invalid_union: 'not-an-option',
  unrecognized_keys: 'unknown-key',
  too_big: 'too-large',
  too_small: 'too-small',
  not_multiple_of: 'not-an-option',
}
const OWN_CODE = /^[a-z]+(-[a-z]+)*$/
export const MAX_PROBLEMS_TOLD = 20

type Issue = z.core.$ZodIssue

function problemsOf(issue: Issue): readonly FieldProblem[] {
  const path = issue.path.join('.')
  if (issue.code === 'unrecognized_keys') {
    return issue.keys.map((key) => ({ path: path ? `${path}.${key}` : key, code: 'unknown-key' }))
  }
  const isMissing =
    issue.code === 'invalid_type' && issue.input === undefined && /undefined/.test(issue.message)
  const code = OWN_CODE.test(issue.message)
    ? issue.message
    : isMissing
      ? 'missing'
      : (CODES[issue.code] ?? 'invalid')
  const { minimum, maximum } = issue as { minimum?: number | bigint; maximum?: number | bigint }
  const args = {
    ...(minimum !== undefined && { min: Number(minimum) }),
    ...(maximum !== undefined && { max: Number(maximum) }),
  }
  return [{ path, code, ...(Object.keys(args).length > 0 && { args }) }]
}

/**
 * What a schema has against a value, field by field. A schema says its own code as the message of a check (`too-long`);
 * everything else gets one by its kind. Text longer than a reasonable name of a field is cut: it came from outside.
 */
export const fieldProblems = (error: z.ZodError): readonly FieldProblem[] =>
  error.issues
    .flatMap(problemsOf)
    .slice(0, MAX_PROBLEMS_TOLD)
    .map((problem) => ({ ...problem, path: problem.path.slice(0, 100) }))
