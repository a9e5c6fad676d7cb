import type { ErrorRequestHandler, Response } from 'express'
import type { Logger } from 'pino'
import { API_ERRORS, type ApiErrorBody, type ApiErrorCode } from '@/shared/api/errors'
import { isDatabaseGone } from './is-database-gone'
import { Refused } from './refused'

/** What body-parser calls its refusals. */
const BODY_ERRORS: Readonly<Record<string, ApiErrorCode>> = {
  'entity.too.large': 'too-large',
  'entity.parse.failed': 'bad-request',
  'encoding.unsupported': 'bad-request',
  'charset.unsupported': 'bad-request',
  'request.aborted': 'bad-request',
  'request.size.invalid': 'bad-request',
}

function refusalFor(error: unknown): Refused {
  if (error instanceof Refused) return error
  const { type, status } = error as { type?: string; status?: number }
  const known = typeof type === 'string' ? BODY_ERRORS[type] : undefined
  if (known) return new Refused(known)
  if (error instanceof URIError || status === 400) return new Refused('bad-request')
  if (isDatabaseGone(error)) return new Refused('unavailable', { cause: error })
  return new Refused('internal', { cause: error })
}

export function answerRefusal(response: Response, { code, fields, retryAfterSeconds }: Refused): void {
  const body: ApiErrorBody = {
    error: { code, ...(fields && { fields }), ...(retryAfterSeconds !== undefined && { retryAfterSeconds }) },
  }
  if (retryAfterSeconds !== undefined) response.setHeader('Retry-After', String(retryAfterSeconds))
  response.status(API_ERRORS[code]).json(body)
}

/** The one place where an error becomes an answer: the expected by their code, the unknown logged whole and answered bare. */
export const answerErrors =
  (log: Logger): ErrorRequestHandler =>
  (error: unknown, _request, response, next) => {
    const refusal = refusalFor(error)
    if (refusal.code === 'internal')
      log.error({ err: error, requestId: response.locals.requestId }, 'request failed')
    if (refusal.code === 'unavailable') {
      const { message } = refusal.cause instanceof Error ? refusal.cause : { message: 'unavailable' }
      log.warn({ requestId: response.locals.requestId, why: message }, 'database unavailable')
    }
    if (response.headersSent) {
      next(error)
      return
    }
    answerRefusal(response, refusal)
  }
