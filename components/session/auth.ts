import { fail, ok, type Result } from '@/shared/result'
import type { FieldProblem } from '@/shared/api/errors'
import { readRefusal, refusalOf, type Refusal } from '@/components/api'

/** better-auth's own answers, as the fields of our forms. Codes: `BASE_ERROR_CODES` of @better-auth/core. */
const FIELDS: Readonly<Record<string, FieldProblem>> = {
  INVALID_EMAIL_OR_PASSWORD: { path: 'password', code: 'no-such-pair' },
  INVALID_EMAIL: { path: 'email', code: 'not-an-address' },
  INVALID_PASSWORD: { path: 'currentPassword', code: 'wrong-password' },
  PASSWORD_TOO_SHORT: { path: 'password', code: 'password-short' },
  PASSWORD_TOO_LONG: { path: 'password', code: 'password-long' },
  USER_ALREADY_EXISTS: { path: 'email', code: 'address-taken' },
  USER_ALREADY_EXISTS_USE_ANOTHER_EMAIL: { path: 'email', code: 'address-taken' },
}

async function send(
  method: 'GET' | 'POST',
  path: string,
  body?: Readonly<Record<string, unknown>>,
): Promise<Result<unknown, Refusal>> {
  let response: Response
  let answer: unknown
  try {
    response = await fetch(`/api/auth${path}`, {
      method,
      credentials: 'same-origin',
      headers: method === 'POST' ? { 'content-type': 'application/json' } : undefined,
      body: method === 'POST' ? JSON.stringify(body ?? {}) : undefined,
    })
    answer = await response.json().catch(() => null)
  } catch {
    return fail(refusalOf('offline'))
  }
  if (response.ok) return ok(answer)
  // Refusals that our own limits and schemas made inside it.
  if ((answer as { error?: unknown } | null)?.error) return fail(readRefusal(response.status, answer))
  const code = (answer as { code?: unknown } | null)?.code
  const field = typeof code === 'string' ? FIELDS[code] : undefined
  if (field) return fail(refusalOf('invalid', { fields: [field] }))
  if (code === 'EMAIL_NOT_VERIFIED') return fail(refusalOf('address-unverified'))
  if (code === 'INVALID_TOKEN' || code === 'TOKEN_EXPIRED') return fail(refusalOf('ended'))
  if (code === 'VALIDATION_ERROR') return fail(refusalOf('invalid'))
  if (response.status === 429) {
    const seconds = Number(response.headers.get('x-retry-after') ?? response.headers.get('retry-after'))
    return fail(refusalOf('too-many-tries', { retryAfterSeconds: seconds > 0 ? seconds : null }))
  }
  if (response.status === 401) return fail(refusalOf('signed-out'))
  return fail(readRefusal(response.status, answer))
}

/** A session as its owner sees it listed. The token names it when it is to be ended. */
export type ListedSession = Readonly<{
  id: string
  token: string
  createdAt: string
  updatedAt: string
  userAgent: string | null
}>

export const auth = {
  signIn: (form: Readonly<{ email: string; password: string }>) => send('POST', '/sign-in/email', form),
  signUp: (form: Readonly<{ name: string; email: string; password: string; callbackURL: string }>) =>
    send('POST', '/sign-up/email', form),
  signOut: () => send('POST', '/sign-out'),
  sendVerification: (email: string, callbackURL: string) =>
    send('POST', '/send-verification-email', { email, callbackURL }),
  verify: (token: string) => send('GET', `/verify-email?token=${encodeURIComponent(token)}`),
  askReset: (email: string) => send('POST', '/request-password-reset', { email, redirectTo: '/reset' }),
  reset: (token: string, newPassword: string) => send('POST', '/reset-password', { token, newPassword }),
  changePassword: (form: Readonly<{ currentPassword: string; newPassword: string }>) =>
    send('POST', '/change-password', { ...form, revokeOtherSessions: true }),
  rename: (name: string) => send('POST', '/update-user', { name }),
  listSessions: async (): Promise<Result<readonly ListedSession[], Refusal>> => {
    const result = await send('GET', '/list-sessions')
    if (!result.ok) return result
    return Array.isArray(result.value) ? ok(result.value as ListedSession[]) : fail(refusalOf('bad-reply'))
  },
  current: () => send('GET', '/get-session'),
  endSession: (token: string) => send('POST', '/revoke-session', { token }),
  endEverySession: () => send('POST', '/revoke-sessions'),
} as const
