import type { Kysely } from 'kysely'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('attempt')
    .addColumn('key', 'text', (column) => column.primaryKey())
    .addColumn('failures', 'integer', (column) => column.notNull())
    .addColumn('windowStartedAt', 'timestamptz', (column) => column.notNull())
    .addColumn('lockedUntil', 'timestamptz')
    .addColumn('locks', 'integer', (column) => column.notNull().defaultTo(0))
    .execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.dropTable('attempt').execute()
}
