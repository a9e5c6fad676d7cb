import { createHash, randomBytes } from 'node:crypto'
import { readdirSync, readFileSync } from 'node:fs'
import path from 'node:path'
import { Client, escapeIdentifier } from 'pg'
import { connect, type Connection } from '@/db/connect'
import { migrateUp } from '@/db/migrate'
import { TEST_SERVER_VARIABLE } from './test-cluster'

const MIGRATIONS_DIRECTORY = path.resolve('db/migrations')
/** Any number, the same in every worker: they take turns at making the template. */
const TEMPLATE_LOCK = 7_201_725

export type TestDatabase = Readonly<{ url: string; db: Connection; drop: () => Promise<void> }>

function serverUrl(): string {
  const url = process.env[TEST_SERVER_VARIABLE]
  if (!url) throw new Error(`${TEST_SERVER_VARIABLE} is not set: run tests through jest's projects`)
  return url
}

function urlOf(database: string, server: string): string {
  const url = new URL(server)
  url.pathname = `/${database}`
  return url.href
}

async function withServer<Value>(server: string, work: (client: Client) => Promise<Value>): Promise<Value> {
  const client = new Client({ connectionString: server })
  await client.connect()
  try {
    return await work(client)
  } finally {
    await client.end()
  }
}

function templateName(): string {
  const hash = createHash('sha256')
  for (const file of readdirSync(MIGRATIONS_DIRECTORY).sort()) {
    hash.update(file).update(readFileSync(path.join(MIGRATIONS_DIRECTORY, file)))
  }
  return `template_${hash.digest('hex').slice(0, 16)}`
}

/** A database migrated from zero once for each state of the migrations, from which tests' own are copied. */
async function ensureTemplate(client: Client, server: string): Promise<string> {
  const name = templateName()
  await client.query('select pg_advisory_lock($1)', [TEMPLATE_LOCK])
  try {
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name])
    if (rowCount) return name
    const making = `${name}_making`
    await client.query(`drop database if exists ${escapeIdentifier(making)} with (force)`)
    await client.query(`create database ${escapeIdentifier(making)}`)
    const db = connect(urlOf(making, server), { connections: 1 })
    await migrateUp(db)
    await db.destroy()
    await client.query(`alter database ${escapeIdentifier(making)} rename to ${escapeIdentifier(name)}`)
    return name
  } finally {
    await client.query('select pg_advisory_unlock($1)', [TEMPLATE_LOCK])
  }
}

/** A database of one's own on real PostgreSQL; `isEmpty` leaves out the tables. Drop it when done. */
export async function createTestDatabase({
  isEmpty = false,
  server = serverUrl(),
}: Readonly<{ isEmpty?: boolean; server?: string }> = {}): Promise<TestDatabase> {
  const name = `test_${randomBytes(8).toString('hex')}`
  await withServer(server, async (client) => {
    const template = isEmpty ? 'template1' : await ensureTemplate(client, server)
    await client.query(`create database ${escapeIdentifier(name)} template ${escapeIdentifier(template)}`)
  })
  const url = urlOf(name, server)
  const db = connect(url)
  return {
    url,
    db,
    drop: async () => {
      await db.destroy()
      await withServer(server, (client) =>
        client.query(`drop database if exists ${escapeIdentifier(name)} with (force)`),
      )
    },
  }
}
