import { sql, type Kysely } from 'kysely'
import { filledNow } from './columns'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('cantus')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('title', 'text', (column) => column.notNull())
    .addColumn('notes', 'jsonb', (column) => column.notNull())
    .addColumn('mode', 'text', (column) => column.notNull())
    .addColumn('final', 'text', (column) => column.notNull())
    .addColumn('clef', 'text', (column) => column.notNull())
    .addColumn('source', 'text', (column) => column.notNull())
    .addColumn('origin', 'text', (column) =>
      column.notNull().check(sql`origin in ('published', 'invented', 'own')`),
    )
    .addColumn('ownerId', 'text', (column) => column.references('user.id').onDelete('cascade'))
    .addColumn('courseId', 'text', (column) => column.references('course.id').onDelete('set null'))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .execute()
  await db.schema.createIndex('cantus_ownerId_idx').on('cantus').column('ownerId').execute()
  await db.schema.createIndex('cantus_courseId_idx').on('cantus').column('courseId').execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.dropTable('cantus').execute()
}
