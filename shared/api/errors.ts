/** Every way in which a request is refused, with its HTTP status. Words come from the locale table, by code. */
export const API_ERRORS = {
  'bad-request': 400,
  'signed-out': 401,
  'address-unverified': 403,
  forbidden: 403,
  'not-found': 404,
  conflict: 409,
  ended: 410,
  'door-closed': 409,
  'lesson-full': 409,
  'code-unknown': 404,
  'name-refused': 422,
  invalid: 422,
  'too-large': 413,
  'too-many-tries': 429,
  unavailable: 503,
  internal: 500,
} as const
export type ApiErrorCode = keyof typeof API_ERRORS

/** What went wrong with one field, so that the form can say it beside the field. */
export type FieldProblem = Readonly<{
  path: string
  code: string
  args?: Readonly<Record<string, string | number>>
}>

/** Body of every refusal. */
export type ApiErrorBody = Readonly<{
  error: Readonly<{ code: ApiErrorCode; fields?: readonly FieldProblem[]; retryAfterSeconds?: number }>
}>
