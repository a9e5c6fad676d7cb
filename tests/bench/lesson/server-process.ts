/** The measured process: the live half of the server, on the database that the environment names. */
import type { AddressInfo } from 'node:net'
import { connect } from '@/db/connect'
import { startLiveServer } from '@/tests/realtime/support/live-server'
import { isQuestion } from './measured-process'

async function startLive(databaseUrl: string): Promise<number> {
  const { httpServer } = await startLiveServer(connect(databaseUrl))
  return (httpServer.address() as AddressInfo).port
}

process.on('message', (message) => {
  if (isQuestion(message, 'cpu')) {
    const { user, system } = process.cpuUsage()
    process.send?.({ kind: 'cpu', value: (user + system) / 1000 })
  } else if (isQuestion(message, 'memory')) {
    globalThis.gc?.()
    process.send?.({ kind: 'memory', value: process.memoryUsage.rss() })
  }
})
process.on('disconnect', () => process.exit(0))
void startLive(process.env.BENCH_DATABASE_URL as string).then((port) =>
  process.send?.({ kind: 'ready', value: port }),
)
