import { Migrator, type MigrationResultSet, type MigrationResult } from 'kysely'
import type { Connection } from '@/db/connect'
import { MIGRATIONS } from '@/db/migrations'

const migratorOf = (db: Connection) =>
  new Migrator({ db, provider: { getMigrations: () => Promise.resolve(MIGRATIONS) } })

function resultsOf({ error, results }: MigrationResultSet): readonly MigrationResult[] {
  if (error) {
    const failed = results?.find(({ status }) => status === 'Error')?.migrationName
    throw new Error(failed ? `Migration ${failed} failed` : 'Migrating failed', { cause: error })
  }
  return results ?? []
}

/** Brings the database up to date. Each run is one transaction: an interrupted one leaves nothing half done. */
export async function migrateUp(db: Connection): Promise<readonly MigrationResult[]> {
  return resultsOf(await migratorOf(db).migrateToLatest())
}

/** Undoes the last migration. */
export async function migrateDown(db: Connection): Promise<readonly MigrationResult[]> {
  return resultsOf(await migratorOf(db).migrateDown())
}
