import { sql } from 'kysely'
import { createTestDatabase } from '@/tests/support/test-database'
import { migrateDown, migrateUp } from '@/db/migrate'
import { MIGRATIONS } from '@/db/migrations'

const tablesOf = async (db: Parameters<typeof migrateUp>[0]) => {
  const { rows } = await sql<{ name: string }>`
    select table_name as name from information_schema.tables where table_schema = 'public' order by 1`.execute(
    db,
  )
  return rows.map(({ name }) => name).filter((name) => !name.startsWith('kysely_'))
}

describe('migrations', () => {
  it('go up from zero, down to zero, and up again to the same tables', async () => {
    const { db, drop } = await createTestDatabase({ isEmpty: true })
    try {
      const names = Object.keys(MIGRATIONS)
      expect((await migrateUp(db)).map(({ migrationName }) => migrationName)).toEqual(names)
      const tables = await tablesOf(db)
      expect(tables.length).toBeGreaterThan(names.length)
      for (const _ of names) await migrateDown(db)
      expect(await tablesOf(db)).toEqual([])
      await migrateUp(db)
      expect(await tablesOf(db)).toEqual(tables)
      expect(await migrateUp(db)).toEqual([])
    } finally {
      await drop()
    }
  })
})
