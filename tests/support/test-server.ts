import { attachRealtime } from '@/realtime/attach'
import { demoPeople } from '@/db/demo/people'
import { upsertLibrary } from '@/db/library/upsert-library'
import { parseConfig, type Config } from '@/server/config'
import { createLog } from '@/server/create-log'
import { createServer, type RunningServer } from '@/server/create-server'
import { startFakeMailProvider, type FakeMailProvider } from '@/server/mail/fake-mail-provider'
import { createMailer } from '@/server/mail/mailer'
import { findFreePort } from '@/db/cluster/find-free-port'
import { createBrowser, type TestBrowser } from './test-browser'
import { createTestDatabase, type TestDatabase } from './test-database'

export const TEST_SECRET = 'a-secret-that-only-tests-know-0123456789'

export type TestServer = Readonly<{
  url: string
  config: Config
  database: TestDatabase
  server: RunningServer
  mail: FakeMailProvider
  /** Everything that was logged, a line each. */
  logged: readonly string[]
  /** A browser with no cookies yet. */
  browser: () => TestBrowser
  close: () => Promise<void>
}>

/** The real app on a database of its own, listening on loopback, its mail going to the fake. */
export async function startTestServer(
  environment: Readonly<Record<string, string>> = {},
  { databaseServer }: Readonly<{ databaseServer?: string }> = {},
): Promise<TestServer> {
  const database = await createTestDatabase(databaseServer === undefined ? {} : { server: databaseServer })
  await upsertLibrary(database.db)
  const port = await findFreePort()
  const config = parseConfig({
    PUBLIC_URL: `http://127.0.0.1:${port}`,
    WEB_DIRECTORY: 'tests/fixtures/web',
    LOG_LEVEL: 'debug',
    ...environment,
  })
  const logged: string[] = []
  const log = createLog(config.logLevel, { write: (line) => void logged.push(line) })
  const mail = await startFakeMailProvider()
  const server = await createServer(config, {
    db: database.db,
    log,
    mailer: createMailer({ apiKey: 'test', from: config.mail.from, baseUrl: mail.url }, log),
    secret: TEST_SECRET,
    demo: config.isDemo ? { mail, people: demoPeople } : null,
    attachRealtime,
  })
  await server.listen(port, '127.0.0.1')
  const url = `http://127.0.0.1:${port}`
  return {
    url,
    config,
    database,
    server,
    mail,
    logged,
    browser: () => createBrowser(url, config.publicUrl),
    close: async () => {
      await server.close()
      await mail.close()
      await database.drop()
    },
  }
}
