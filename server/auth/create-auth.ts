import { betterAuth } from 'better-auth'
import { APIError, createAuthMiddleware } from 'better-auth/api'
import { anonymous } from 'better-auth/plugins'
import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { moveMemberships } from '@/db/queries/lesson-members'
import { emailSchema, nameSchema } from '@/shared/api/fields'
import { fieldProblems } from '@/shared/api/field-problems'
import { SOURCE_HEADER } from '@/server/http/client-source'
import type { Limits } from '@/server/limits/create-limits'
import type { Mailer } from '@/server/mail/mailer'
import { existingAccountMessage, resetMessage, verificationMessage } from '@/server/mail/messages'

export const MIN_PASSWORD_CHARACTERS = 10
export const MAX_PASSWORD_CHARACTERS = 128
const DAY_SECONDS = 24 * 60 * 60
const SESSION_SECONDS = 14 * DAY_SECONDS
const VERIFICATION_SECONDS = DAY_SECONDS
const RESET_SECONDS = 60 * 60

/** The library's routes that are served. The rest of its catalogue is not found. */
export const AUTH_PATHS: ReadonlySet<string> = new Set([
  '/sign-up/email',
  '/sign-in/email',
  '/sign-out',
  '/get-session',
  '/list-sessions',
  '/revoke-session',
  '/revoke-sessions',
  '/revoke-other-sessions',
  '/request-password-reset',
  '/reset-password',
  '/send-verification-email',
  '/verify-email',
  '/change-password',
  '/update-user',
])

/** Those that make us send a message to an address somebody typed. */
const MAILING_PATHS = new Set(['/sign-up/email', '/request-password-reset', '/send-verification-email'])

type AuthOptions = Readonly<{
  db: Connection
  publicUrl: string
  allowedOrigins: readonly string[]
  secret: string
  limits: Limits
  mailer: Mailer
  log: Logger
  /** Told of every login that ended, by whatever way. */
  onSessionEnded: (sessionId: string) => void
}>

const tooManyTries = (waitMs: number) => {
  const retryAfterSeconds = Math.ceil(waitMs / 1000)
  return new APIError(
    'TOO_MANY_REQUESTS',
    { code: 'TOO_MANY_TRIES', error: { code: 'too-many-tries', retryAfterSeconds } },
    { 'Retry-After': String(retryAfterSeconds) },
  )
}

const emailOf = (body: unknown): string | null => {
  const parsed = emailSchema.safeParse((body as { email?: unknown } | null)?.email)
  return parsed.success ? parsed.data : null
}

export type Auth = ReturnType<typeof createAuth>

/** Accounts and logins, by the sign-in library over our own tables. */
export function createAuth(options: AuthOptions) {
  const { db, publicUrl, limits, mailer, log } = options
  const source = (headers: Headers | undefined) => headers?.get(SOURCE_HEADER) ?? 'unknown'
  return betterAuth({
    appName: 'Bicinium',
    baseURL: publicUrl,
    basePath: '/api/auth',
    secret: options.secret,
    trustedOrigins: [...options.allowedOrigins],
    database: { db, type: 'postgres' },
    telemetry: { enabled: false },
    logger: {
      level: 'warn',
      // Its messages may hold addresses; what it says goes to the log without its arguments.
      log: (level, message) =>
        log[level === 'error' ? 'error' : 'debug']({ from: 'sign-in' }, message.slice(0, 120)),
    },
    // Its refusals become answers all the same; what it did not expect comes to our own error table.
    onAPIError: { throw: true },
    // It would count by address and lock a class out; ours counts by account (server/limits).
    rateLimit: { enabled: false },
    user: {
      additionalFields: {
        isAdministrator: { type: 'boolean', required: false, defaultValue: false, input: false },
        mayMakeCourses: { type: 'boolean', required: false, defaultValue: false, input: false },
      },
    },
    session: { expiresIn: SESSION_SECONDS, updateAge: DAY_SECONDS, cookieCache: { enabled: false } },
    advanced: {
      cookiePrefix: 'bicinium',
      useSecureCookies: publicUrl.startsWith('https:'),
      defaultCookieAttributes: { httpOnly: true, sameSite: 'lax' },
      // We keep no addresses of people.
      ipAddress: { disableIpTracking: true },
      disableCSRFCheck: false,
      disableOriginCheck: false,
    },
    emailAndPassword: {
      enabled: true,
      minPasswordLength: MIN_PASSWORD_CHARACTERS,
      maxPasswordLength: MAX_PASSWORD_CHARACTERS,
      requireEmailVerification: true,
      revokeSessionsOnPasswordReset: true,
      resetPasswordTokenExpiresIn: RESET_SECONDS,
      sendResetPassword: ({ user, token }) =>
        mailer.send(
          resetMessage(user.email, user.name, `${publicUrl}/reset?token=${encodeURIComponent(token)}`),
        ),
      onExistingUserSignUp: ({ user }) =>
        mailer.send(existingAccountMessage(user.email, user.name, `${publicUrl}/forgot`)),
    },
    emailVerification: {
      sendOnSignUp: true,
      autoSignInAfterVerification: true,
      expiresIn: VERIFICATION_SECONDS,
      sendVerificationEmail: ({ user, token }) =>
        mailer.send(
          verificationMessage(
            user.email,
            user.name,
            `${publicUrl}/verify?token=${encodeURIComponent(token)}`,
          ),
        ),
    },
    plugins: [
      anonymous({
        generateRandomEmail: () => `guest-${crypto.randomUUID()}@guest.invalid`,
        // Signing in as a guest of a lesson removes the guest: what it owns goes along first.
        onLinkAccount: async ({ anonymousUser, newUser }) => {
          await moveMemberships(db, anonymousUser.user.id, newUser.user.id)
        },
      }),
    ],
    databaseHooks: {
      session: { delete: { after: async (session) => options.onSessionEnded(session.id) } },
    },
    hooks: {
      before: createAuthMiddleware(async (context) => {
        const { path, body, headers } = context
        const email = emailOf(body)
        if (path === '/sign-up/email' || path === '/update-user') {
          const name: unknown = body?.name
          const parsed = nameSchema.safeParse(name)
          if (!parsed.success && (path === '/sign-up/email' || name !== undefined)) {
            const fields = fieldProblems(parsed.error).map((problem) => ({ ...problem, path: 'name' }))
            throw new APIError('UNPROCESSABLE_ENTITY', {
              code: 'INVALID_NAME',
              error: { code: 'invalid', fields },
            })
          }
          if (body?.image)
            throw new APIError('UNPROCESSABLE_ENTITY', { code: 'INVALID_IMAGE', error: { code: 'invalid' } })
        }
        if (!email) return
        if (path === '/sign-in/email') {
          const waitMs = await limits.takeSignIn(email, source(headers))
          if (waitMs > 0) throw tooManyTries(waitMs)
        }
        if (MAILING_PATHS.has(path)) {
          const waitMs = await limits.takeMail(email, source(headers))
          if (waitMs > 0) throw tooManyTries(waitMs)
        }
      }),
      after: createAuthMiddleware(async (context) => {
        const email = context.path === '/sign-in/email' ? emailOf(context.body) : null
        // The right password with an address not yet confirmed is no guess either.
        const { returned } = context.context
        const isUnverified = returned instanceof APIError && returned.body?.code === 'EMAIL_NOT_VERIFIED'
        if (email && (isUnverified || !(returned instanceof APIError))) {
          await limits.forgiveSignIn(email, source(context.headers))
        }
      }),
    },
  })
}
