import type { Kysely } from 'kysely'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('journalChange')
    .addColumn('lessonId', 'text', (column) => column.notNull().references('lesson.id').onDelete('cascade'))
    .addColumn('document', 'text', (column) => column.notNull())
    .addColumn('ordinal', 'integer', (column) => column.notNull())
    .addColumn('author', 'text')
    .addColumn('at', 'timestamptz', (column) => column.notNull())
    .addColumn('bytes', 'bytea', (column) => column.notNull())
    .addPrimaryKeyConstraint('journalChange_pkey', ['lessonId', 'document', 'ordinal'])
    .execute()
  await db.schema
    .createTable('journalEvent')
    .addColumn('id', 'bigint', (column) => column.primaryKey().generatedAlwaysAsIdentity())
    .addColumn('lessonId', 'text', (column) => column.notNull().references('lesson.id').onDelete('cascade'))
    .addColumn('author', 'text')
    .addColumn('at', 'timestamptz', (column) => column.notNull())
    .addColumn('event', 'jsonb', (column) => column.notNull())
    .execute()
  await db.schema
    .createIndex('journalEvent_lessonId_idx')
    .on('journalEvent')
    .columns(['lessonId', 'id'])
    .execute()
  await db.schema
    .createTable('journalSnapshot')
    .addColumn('lessonId', 'text', (column) => column.notNull().references('lesson.id').onDelete('cascade'))
    .addColumn('document', 'text', (column) => column.notNull())
    .addColumn('ordinal', 'integer', (column) => column.notNull())
    .addColumn('bytes', 'bytea', (column) => column.notNull())
    .addColumn('clients', 'jsonb', (column) => column.notNull())
    .addColumn('at', 'timestamptz', (column) => column.notNull())
    .addPrimaryKeyConstraint('journalSnapshot_pkey', ['lessonId', 'document'])
    .execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of ['journalSnapshot', 'journalEvent', 'journalChange']) {
    await db.schema.dropTable(table).execute()
  }
}
