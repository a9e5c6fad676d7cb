import { Client, escapeIdentifier } from 'pg'

const DUPLICATE_DATABASE = '42P04'

/** Makes the database `name` on the server that `adminUrl` leads to, unless it is there. */
export async function ensureDatabase(adminUrl: string, name: string): Promise<void> {
  const client = new Client({ connectionString: adminUrl })
  await client.connect()
  try {
    const { rowCount } = await client.query('select 1 from pg_database where datname = $1', [name])
    if (rowCount === 0) await client.query(`create database ${escapeIdentifier(name)}`)
  } catch (error) {
    if ((error as { code?: string }).code !== DUPLICATE_DATABASE) throw error
  } finally {
    await client.end()
  }
}
