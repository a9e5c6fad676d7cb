import { sql, type Kysely } from 'kysely'
import { filledNow } from './columns'

export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('course')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('name', 'text', (column) => column.notNull())
    .addColumn('isArchived', 'boolean', (column) => column.notNull().defaultTo(false))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .execute()
  await db.schema
    .createTable('courseMember')
    .addColumn('courseId', 'text', (column) => column.notNull().references('course.id').onDelete('cascade'))
    .addColumn('userId', 'text', (column) => column.notNull().references('user.id').onDelete('cascade'))
    .addColumn('role', 'text', (column) =>
      column.notNull().check(sql`role in ('teacher', 'assistant', 'student')`),
    )
    .addColumn('joinedAt', 'timestamptz', filledNow)
    .addPrimaryKeyConstraint('courseMember_pkey', ['courseId', 'userId'])
    .execute()
  await db.schema.createIndex('courseMember_userId_idx').on('courseMember').column('userId').execute()
  await db.schema
    .createTable('invitation')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('courseId', 'text', (column) => column.notNull().references('course.id').onDelete('cascade'))
    .addColumn('kind', 'text', (column) => column.notNull().check(sql`kind in ('email', 'link')`))
    .addColumn('email', 'text', (column) => column.check(sql`(kind = 'email') = (email is not null)`))
    .addColumn('role', 'text', (column) =>
      column.notNull().check(sql`role in ('teacher', 'assistant', 'student')`),
    )
    .addColumn('tokenHash', 'text', (column) => column.notNull().unique())
    .addColumn('invitedBy', 'text', (column) => column.references('user.id').onDelete('set null'))
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('expiresAt', 'timestamptz', (column) => column.notNull())
    .addUniqueConstraint('invitation_course_email', ['courseId', 'email'])
    .execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of ['invitation', 'courseMember', 'course']) await db.schema.dropTable(table).execute()
}
