import { toNodeHandler } from 'better-auth/node'
import { Router } from 'express'
import { SOURCE_HEADER, sourceOf } from '@/server/http/client-source'
import { Refused } from '@/server/errors/refused'
import { AUTH_PATHS, type Auth } from './create-auth'

export const AUTH_ROOT = '/api/auth'

/** Hands the served part of `/api/auth` to the sign-in library. Bodies have been read, and capped, before. */
export function serveAuth(auth: Auth): Router {
  const handle = toNodeHandler(auth)
  const router = Router()
  router.all(`${AUTH_ROOT}/{*any}`, async (request, response) => {
    const path = request.path.slice(AUTH_ROOT.length)
    if (!AUTH_PATHS.has(path)) throw new Refused('not-found')
    response.locals.route = AUTH_ROOT + path
    request.headers[SOURCE_HEADER] = sourceOf(request)
    response.setHeader('Cache-Control', 'no-store')
    await handle(request, response)
  })
  return router
}
