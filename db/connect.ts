import { Kysely, PostgresDialect } from 'kysely'
import { Pool } from 'pg'
import type { Database } from '@/db/schema'

export const POOL_CONNECTIONS = 10
const CONNECT_TIMEOUT_MS = 5_000
/** A request waits no longer than this for the database; nothing we ask takes a tenth of it. */
const STATEMENT_TIMEOUT_MS = 15_000

export type Connection = Kysely<Database>

/**
 * Opens a pool on the database at `url`. An idle connection that the server drops must not end the process: such errors
 * go to `onError`, and the next query opens another.
 */
export function connect(
  url: string,
  {
    connections = POOL_CONNECTIONS,
    onError = () => {},
  }: { connections?: number; onError?: (error: Error) => void } = {},
): Connection {
  const pool = new Pool({
    connectionString: url,
    max: connections,
    connectionTimeoutMillis: CONNECT_TIMEOUT_MS,
    statement_timeout: STATEMENT_TIMEOUT_MS,
    application_name: 'bicinium',
  })
  pool.on('error', onError)
  return new Kysely<Database>({ dialect: new PostgresDialect({ pool }) })
}
