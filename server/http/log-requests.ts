import { randomUUID } from 'node:crypto'
import type { RequestHandler } from 'express'
import type { Logger } from 'pino'

/**
 * Gives every request an id and logs its end. The pattern of the route is logged and not the address, for codes and tokens
 * stand in addresses; neither is who asked, nor from where.
 */
export const logRequests =
  (log: Logger): RequestHandler =>
  (request, response, next) => {
    const startedAt = process.hrtime.bigint()
    const requestId = randomUUID()
    response.locals.requestId = requestId
    response.setHeader('X-Request-Id', requestId)
    response.on('finish', () => {
      const route = (response.locals.route as string | undefined) ?? 'other'
      const ms = Number(process.hrtime.bigint() - startedAt) / 1e6
      log.debug(
        {
          requestId,
          method: request.method,
          route,
          status: response.statusCode,
          ms: Math.round(ms * 10) / 10,
        },
        'request',
      )
    })
    next()
  }
