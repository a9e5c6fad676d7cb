import type { ApiErrorCode, FieldProblem } from '@/shared/api/errors'

type More = Readonly<{ fields?: readonly FieldProblem[]; retryAfterSeconds?: number; cause?: unknown }>

/** An expected failure of a request, by its code. `API_ERRORS` gives its status, the locale table its words. */
export class Refused extends Error {
  override readonly name = 'Refused'
  readonly fields: readonly FieldProblem[] | undefined
  readonly retryAfterSeconds: number | undefined

  constructor(
    readonly code: ApiErrorCode,
    { fields, retryAfterSeconds, cause }: More = {},
  ) {
    super(code, { cause })
    this.fields = fields
    this.retryAfterSeconds = retryAfterSeconds
  }
}

/** What `find` gave, or the refusal of one who asks for something that is not there or not theirs to know of. */
export function found<Value>(value: Value | null | undefined): Value {
  if (value === null || value === undefined) throw new Refused('not-found')
  return value
}
