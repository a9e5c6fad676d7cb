import type { Kysely } from 'kysely'
import { filledNow } from './columns'

/** The tables the sign-in library asks for (checked against it by a test), with what is ours on `user`. */
export async function up(db: Kysely<unknown>): Promise<void> {
  await db.schema
    .createTable('user')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('name', 'text', (column) => column.notNull())
    .addColumn('email', 'text', (column) => column.notNull().unique())
    .addColumn('emailVerified', 'boolean', (column) => column.notNull())
    .addColumn('image', 'text')
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('updatedAt', 'timestamptz', filledNow)
    .addColumn('isAnonymous', 'boolean')
    .addColumn('isAdministrator', 'boolean', (column) => column.notNull().defaultTo(false))
    .addColumn('mayMakeCourses', 'boolean', (column) => column.notNull().defaultTo(false))
    .execute()
  await db.schema
    .createTable('session')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('expiresAt', 'timestamptz', (column) => column.notNull())
    .addColumn('token', 'text', (column) => column.notNull().unique())
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('updatedAt', 'timestamptz', (column) => column.notNull())
    .addColumn('ipAddress', 'text')
    .addColumn('userAgent', 'text')
    .addColumn('userId', 'text', (column) => column.notNull().references('user.id').onDelete('cascade'))
    .execute()
  await db.schema
    .createTable('account')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('accountId', 'text', (column) => column.notNull())
    .addColumn('providerId', 'text', (column) => column.notNull())
    .addColumn('userId', 'text', (column) => column.notNull().references('user.id').onDelete('cascade'))
    .addColumn('accessToken', 'text')
    .addColumn('refreshToken', 'text')
    .addColumn('idToken', 'text')
    .addColumn('accessTokenExpiresAt', 'timestamptz')
    .addColumn('refreshTokenExpiresAt', 'timestamptz')
    .addColumn('scope', 'text')
    .addColumn('password', 'text')
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('updatedAt', 'timestamptz', (column) => column.notNull())
    .execute()
  await db.schema
    .createTable('verification')
    .addColumn('id', 'text', (column) => column.primaryKey())
    .addColumn('identifier', 'text', (column) => column.notNull())
    .addColumn('value', 'text', (column) => column.notNull())
    .addColumn('expiresAt', 'timestamptz', (column) => column.notNull())
    .addColumn('createdAt', 'timestamptz', filledNow)
    .addColumn('updatedAt', 'timestamptz', filledNow)
    .execute()
  await db.schema.createIndex('session_userId_idx').on('session').column('userId').execute()
  await db.schema.createIndex('account_userId_idx').on('account').column('userId').execute()
  await db.schema.createIndex('verification_identifier_idx').on('verification').column('identifier').execute()
}

export async function down(db: Kysely<unknown>): Promise<void> {
  for (const table of ['verification', 'account', 'session', 'user'])
    await db.schema.dropTable(table).execute()
}
