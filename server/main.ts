/**
 * The server's entry point: reads the environment, brings the database up, and serves. `npm start` runs it when
 * everything it needs is installed and built; `npx tsx server/main.ts` runs it alone.
 */
import path from 'node:path'
import { ClusterError } from '@/db/cluster/cluster-error'
import { ensureDatabase } from '@/db/cluster/ensure-database'
import { findFreePort } from '@/db/cluster/find-free-port'
import { startCluster, type Cluster } from '@/db/cluster/start-cluster'
import { connect } from '@/db/connect'
import { demoPeople } from '@/db/demo/people'
import { upsertLibrary } from '@/db/library/upsert-library'
import { migrateUp } from '@/db/migrate'
import { attachRealtime } from '@/realtime/attach'
import { ConfigError, parseConfig, type Config } from './config'
import { createLog } from './create-log'
import { createServer } from './create-server'
import { seedDemo } from './demo/seed-demo'
import { startFakeMailProvider } from './mail/fake-mail-provider'
import { createMailer } from './mail/mailer'
import { ensureAdministrator } from './start-up/ensure-administrator'
import { readSecret } from './start-up/read-secret'
import { formatWelcome, lanAddresses, showStep } from './start-up/report'

const DATABASE = 'bicinium'

/** Undone in reverse at the end: what was begun last ends first. */
const endings: (() => Promise<void>)[] = []

async function openDatabase(config: Config): Promise<string> {
  if (config.databaseUrl !== null) return config.databaseUrl
  const cluster: Cluster = await showStep('PostgreSQL', () =>
    startCluster(path.join(config.dataDirectory, 'postgres')),
  )
  endings.push(cluster.release)
  await ensureDatabase(cluster.urlOf('postgres'), DATABASE)
  return cluster.urlOf(DATABASE)
}

/** A port that is taken is named; unless it was asked for, the next free one is used. */
async function choosePort(environment: NodeJS.ProcessEnv): Promise<number> {
  const { port, host } = parseConfig(environment)
  const free = await findFreePort(port, host)
  if (port === 0 || free === port) return free
  if (environment.PORT) {
    throw new ConfigError(
      `Port ${port} is taken. Stop what uses it, or choose another: PORT=${free} npm start`,
    )
  }
  console.log(`  Port ${port} is taken; using ${free}. (PORT=… chooses one.)`)
  return free
}

async function run(environment: NodeJS.ProcessEnv): Promise<void> {
  const port = await choosePort(environment)
  const lan = lanAddresses().map((address) => `http://${address}:${port}`)
  const isOpenToLan = !environment.PUBLIC_URL && (environment.HOST ?? '0.0.0.0') === '0.0.0.0'
  const origins = [environment.ALLOWED_ORIGINS, `http://127.0.0.1:${port}`, ...(isOpenToLan ? lan : [])]
  const config = parseConfig({
    ...environment,
    PORT: String(port),
    ALLOWED_ORIGINS: origins.filter(Boolean).join(','),
  })
  const log = createLog(config.logLevel)
  const db = connect(await openDatabase(config), {
    onError: ({ message }) => log.warn({ why: message }, 'database'),
  })
  endings.push(() => db.destroy())
  await showStep('Migrations', () => migrateUp(db))
  await upsertLibrary(db)
  if (config.isDemo) await showStep('The invented school', () => seedDemo(db))

  const fake = config.mail.apiKey === null ? await startFakeMailProvider() : null
  if (fake) endings.push(fake.close)
  const mailer = createMailer(
    { apiKey: config.mail.apiKey ?? 'local', from: config.mail.from, baseUrl: fake?.url },
    log,
  )
  const server = await createServer(config, {
    ...{ db, log, mailer, attachRealtime },
    secret: config.authSecret ?? readSecret(config.dataDirectory),
    demo: config.isDemo && fake ? { mail: fake, people: demoPeople } : null,
  })
  endings.push(server.close)
  await server.listen(port, config.host)
  if (
    !config.isDemo &&
    config.adminEmail &&
    (await ensureAdministrator(db, server.auth, config.adminEmail))
  ) {
    console.log(`  ${config.adminEmail} was sent a link to become the first administrator.`)
  }
  console.log(
    formatWelcome({
      publicUrl: config.publicUrl,
      lanUrls: isOpenToLan ? lan : [],
      demo: config.isDemo ? demoPeople : null,
    }),
  )
}

let isEnding = false
async function end(exitCode: number): Promise<void> {
  if (isEnding) return
  isEnding = true
  for (const ending of endings.reverse()) {
    await ending().catch((error: Error) => console.error(`  While stopping: ${error.message}`))
  }
  process.exit(exitCode)
}

process.on('SIGINT', () => void end(0))
process.on('SIGTERM', () => void end(0))

run(process.env).catch((error: unknown) => {
  const isExpected = error instanceof ClusterError || error instanceof ConfigError
  console.error(isExpected ? `\n${error.message}\n` : error)
  void end(1)
})
