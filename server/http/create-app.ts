import compression from 'compression'
import express, { type Express } from 'express'
import { serveAuth, AUTH_ROOT } from '@/server/auth/serve-auth'
import { answerErrors } from '@/server/errors/answer-errors'
import { Refused } from '@/server/errors/refused'
import { createCantusRoutes } from '@/server/routes/cantus'
import type { Context } from '@/server/routes/context'
import { createCourseRoutes } from '@/server/routes/courses'
import { createDemoRoutes } from '@/server/routes/demo'
import { createInvitationRoutes } from '@/server/routes/invitations'
import { createJoinRoutes } from '@/server/routes/join'
import { createLessonRoutes } from '@/server/routes/lessons'
import { createMemberRoutes } from '@/server/routes/members'
import { createPeopleRoutes } from '@/server/routes/people'
import { createRuleSetRoutes } from '@/server/routes/rule-sets'
import { serveSchemas } from './serve-schemas'
import { createWallRoutes } from '@/server/routes/walls'
import { guardOrigin } from './guard-origin'
import { logRequests } from './log-requests'
import { securityHeaders } from './security-headers'
import { serveWeb } from './serve-web'

/** The largest body: an exercise with its rule set, or two hundred pasted addresses. */
export const MAX_BODY_BYTES = 64 * 1024
export const MAX_AUTH_BODY_BYTES = 8 * 1024

/** Every request of the API and of the web client, in the order they are looked at. */
export function createApp(context: Context): Express {
  const { config, log } = context
  const app = express()
  app.disable('x-powered-by')
  app.disable('etag')
  app.set('trust proxy', config.trustedProxies)
  app.set('query parser', 'simple')
  app.use(logRequests(log))
  app.use(securityHeaders(config))
  app.use(compression())
  app.use('/api', guardOrigin(config.allowedOrigins))
  app.use(AUTH_ROOT, express.json({ limit: MAX_AUTH_BODY_BYTES }))
  app.use('/api', express.json({ limit: MAX_BODY_BYTES }))
  app.use(serveAuth(context.auth))
  for (const createRoutes of [
    createPeopleRoutes,
    createCourseRoutes,
    createMemberRoutes,
    createInvitationRoutes,
    createCantusRoutes,
    createRuleSetRoutes,
    createLessonRoutes,
    createWallRoutes,
    createJoinRoutes,
    createDemoRoutes,
  ]) {
    app.use(createRoutes(context))
  }
  app.use('/api', () => {
    throw new Refused('not-found')
  })
  app.use(serveSchemas())
  app.use(serveWeb(config.webDirectory))
  app.use(answerErrors(log))
  return app
}
