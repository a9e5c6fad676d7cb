import { createServer as createHttpServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import type { Realtime, RealtimeOptions } from '@/realtime/contract'
import { createAuth, type Auth } from './auth/create-auth'
import type { Config } from './config'
import { createApp } from './http/create-app'
import { createIdentify } from './lessons/create-identify'
import { createLimits } from './limits/create-limits'
import type { Mailer } from './mail/mailer'
import type { Context } from './routes/context'
import { startSweeping } from './sweep'

/** A request is sent within this; slow senders do not hold connections. */
const REQUEST_TIMEOUT_MS = 30_000
const HEADERS_TIMEOUT_MS = 15_000

export type ServerDeps = Readonly<{
  db: Connection
  log: Logger
  mailer: Mailer
  /** Secret of cookies and wall links. */
  secret: string
  demo: Context['demo']
  attachRealtime: (options: RealtimeOptions) => Promise<Realtime>
}>

export type RunningServer = Readonly<{
  httpServer: Server
  auth: Auth
  realtime: Realtime
  /** Listens, and gives the port it got. */
  listen: (port: number, host: string) => Promise<number>
  close: () => Promise<void>
}>

/** Puts the house together: one HTTP server for the API, the web client and everything live. */
export async function createServer(config: Config, deps: ServerDeps): Promise<RunningServer> {
  const { db, log, mailer, secret, demo } = deps
  const limits = createLimits(db)
  // The routes tell the rooms, and the rooms ask the routes' rules: the knot is tied once both are there.
  let attached: Realtime | null = null
  const realtime = () => {
    if (!attached) throw new Error('The live rooms are not attached yet')
    return attached
  }
  const auth = createAuth({
    ...{ db, secret, limits, mailer, log },
    publicUrl: config.publicUrl,
    allowedOrigins: config.allowedOrigins,
    onSessionEnded: (sessionId) => realtime().sessionEnded(sessionId),
  })
  const app = createApp({ config, secret, db, auth, limits, mailer, log, realtime, demo })
  const httpServer = createHttpServer(
    { requestTimeout: REQUEST_TIMEOUT_MS, headersTimeout: HEADERS_TIMEOUT_MS },
    app,
  )
  attached = await deps.attachRealtime({
    httpServer,
    db,
    identify: createIdentify({ auth, db }),
    allowedOrigins: config.allowedOrigins,
    log,
  })
  const stopSweeping = startSweeping(db, log)
  return {
    httpServer,
    auth,
    realtime: attached,
    listen: (port, host) =>
      new Promise((resolve, reject) => {
        httpServer.once('error', reject)
        httpServer.listen(port, host, () => {
          httpServer.off('error', reject)
          resolve((httpServer.address() as AddressInfo).port)
        })
      }),
    close: async () => {
      await stopSweeping()
      await realtime().close()
      const closed = new Promise<void>((resolve) => httpServer.close(() => resolve()))
      httpServer.closeAllConnections()
      await closed
    },
  }
}
