import type { Kysely } from 'kysely'
import { filledNow } from './columns'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('ruleSet')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('name', 'text', (column) => column.notNull())
    .addColumn('basedOn', 'text')
    .addColumn('rules', 'jsonb', (column) => column.notNull())
    .addColumn('ownerId', 'text', (column) => column.notNull().references('user.id').onDelete('cascade'))
    .addColumn('courseId', 'text', (column) => column.references('course.id').onDelete('set null'))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('updatedAt', 'timestamptz', filledNow)
    .execute()
  await db.schema.createIndex('ruleSet_ownerId_idx').on('ruleSet').column('ownerId').execute()
  await db.schema.createIndex('ruleSet_courseId_idx').on('ruleSet').column('courseId').execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  await db.schema.dropTable('ruleSet').execute()
}
