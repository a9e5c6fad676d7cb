import type { RequestHandler } from 'express'
import { Refused } from '@/server/errors/refused'

const SAFE_METHODS = new Set(['GET', 'HEAD', 'OPTIONS'])

/**
 * Refuses requests that another site's page makes a browser send with our cookies. A browser names the page's origin with
 * everything but a plain reading; what names none and is not said to come from our own page is refused too.
 */
export const guardOrigin =
  (allowedOrigins: readonly string[]): RequestHandler =>
  (request, _response, next) => {
    if (SAFE_METHODS.has(request.method)) return next()
    const { origin } = request.headers
    const isOurs =
      origin === undefined
        ? request.headers['sec-fetch-site'] === 'same-origin'
        : allowedOrigins.includes(origin)
    next(isOurs ? undefined : new Refused('forbidden'))
  }
