import { createServer, type Server } from 'node:http'
import type { AddressInfo } from 'node:net'
import pino, { type Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { attachRealtime } from '@/realtime/attach'
import type { Realtime, RealtimeOptions } from '@/realtime/contract'
import { createIdentify } from './cookies'

export type LiveServer = Readonly<{
  origin: string
  realtime: Realtime
  endedSessions: Set<string>
  httpServer: Server
  close: () => Promise<void>
}>

/** The live half of the server alone, on a port of its own. */
export async function startLiveServer(
  db: Connection,
  more: Partial<RealtimeOptions> & { port?: number; log?: Logger } = {},
): Promise<LiveServer> {
  const httpServer = createServer((_, response) => response.writeHead(404).end())
  await new Promise<void>((resolve) => httpServer.listen(more.port ?? 0, '127.0.0.1', resolve))
  const origin = `http://127.0.0.1:${(httpServer.address() as AddressInfo).port}`
  const endedSessions = new Set<string>()
  const realtime = await attachRealtime({
    httpServer,
    db,
    identify: createIdentify(db, endedSessions),
    allowedOrigins: [origin],
    log: pino({ level: process.env.TEST_LOG ?? 'silent' }),
    ...more,
  })
  return {
    origin,
    realtime,
    endedSessions,
    httpServer,
    close: async () => {
      await realtime.close()
      httpServer.closeAllConnections()
      await new Promise((resolve) => httpServer.close(resolve))
    },
  }
}
