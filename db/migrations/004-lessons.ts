import { sql, type Kysely } from 'kysely'
import { filledNow } from './columns'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('lesson')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('courseId', 'text', (column) => column.notNull().references('course.id').onDelete('cascade'))
    .addColumn('title', 'text', (column) => column.notNull())
    .addColumn('status', 'text', (column) =>
      column.notNull().check(sql`status in ('prepared', 'open', 'ended')`),
    )
    .addColumn('isDoorOpen', 'boolean', (column) => column.notNull().defaultTo(true))
    .addColumn('code', 'text', (column) => column.check(sql`(status = 'open') = (code is not null)`))
    .addColumn('createdBy', 'text', (column) => column.references('user.id').onDelete('set null'))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('openedAt', 'timestamptz')
    .addColumn('endedAt', 'timestamptz')
    .addUniqueConstraint('lesson_code_key', ['code'])
    .execute()
  await db.schema.createIndex('lesson_courseId_idx').on('lesson').column('courseId').execute()
  await db.schema
    .createTable('lessonMember')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('lessonId', 'text', (column) => column.notNull().references('lesson.id').onDelete('cascade'))
    .addColumn('userId', 'text', (column) => column.references('user.id').onDelete('set null'))
    .addColumn('name', 'text', (column) => column.notNull())
    .addColumn('role', 'text', (column) =>
      column.notNull().check(sql`role in ('teacher', 'assistant', 'student', 'guest')`),
    )
    .addColumn('isRemoved', 'boolean', (column) => column.notNull().defaultTo(false))
    .addColumn('joinedAt', 'timestamptz', filledNow)
    .addUniqueConstraint('lessonMember_lesson_user', ['lessonId', 'userId'])
    .execute()
  await db.schema.createIndex('lessonMember_userId_idx').on('lessonMember').column('userId').execute()
  await db.schema
    .createTable('wallSession')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('lessonId', 'text', (column) => column.notNull().references('lesson.id').onDelete('cascade'))
    .addColumn('tokenHash', 'text', (column) => column.notNull().unique())
    .addColumn('linkId', 'text', (column) => column.notNull().unique())
    .addColumn('openedBy', 'text', (column) => column.references('user.id').onDelete('set null'))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('expiresAt', 'timestamptz', (column) => column.notNull())
    .execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of ['wallSession', 'lessonMember', 'lesson']) await db.schema.dropTable(table).execute()
}
