import { sql, type Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import type { UserTable } from '@/db/schema/accounts'
import { PAGE_SIZE } from '@/shared/api/fields'
import { pageFrom, type Page, type PageRequest } from './page'
import { foldedColumn, patternOf, readingOrder } from './search-text'

export type User = Selectable<UserTable>
export type Person = User & Readonly<{ courses: number }>

export const findUser = (db: Connection, userId: string): Promise<User | undefined> =>
  db.selectFrom('user').selectAll().where('id', '=', userId).executeTakeFirst()

export const findUserByEmail = (db: Connection, email: string): Promise<User | undefined> =>
  db.selectFrom('user').selectAll().where('email', '=', email.toLowerCase()).executeTakeFirst()

export const countAdministrators = async (db: Connection): Promise<number> => {
  const { count } = await db
    .selectFrom('user')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where('isAdministrator', '=', true)
    .executeTakeFirstOrThrow()
  return Number(count)
}

const selectPeople = (db: Connection) =>
  db
    .selectFrom('user')
    .selectAll()
    .select(({ selectFrom }) =>
      selectFrom('courseMember')
        .select(({ fn }) => fn.countAll<string>().as('count'))
        .whereRef('courseMember.userId', '=', 'user.id')
        .as('courses'),
    )
    .where(sql<boolean>`"isAnonymous" is not true`)

const toPerson = (row: User & { courses: string | null }): Person => ({
  ...row,
  courses: Number(row.courses),
})

/** Everyone with an account; guests have none. */
export async function listPeople(db: Connection, { offset, search }: PageRequest): Promise<Page<Person>> {
  const matching = (pattern: string) =>
    sql<boolean>`(${foldedColumn('user.name')} like ${pattern} or ${foldedColumn('user.email')} like ${pattern})`
  const pattern = patternOf(search)
  const { count } = await db
    .selectFrom('user')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where(sql<boolean>`"isAnonymous" is not true`)
    .where(matching(pattern))
    .executeTakeFirstOrThrow()
  const rows = await selectPeople(db)
    .where(matching(pattern))
    .orderBy(readingOrder('user.name'))
    .orderBy('user.id')
    .offset(offset)
    .limit(PAGE_SIZE)
    .execute()
  return pageFrom(rows.map(toPerson), Number(count), offset)
}

export async function updatePerson(
  db: Connection,
  userId: string,
  changes: Readonly<{ mayMakeCourses: boolean }>,
): Promise<Person | undefined> {
  await db
    .updateTable('user')
    .set({ ...changes, updatedAt: new Date() })
    .where('id', '=', userId)
    .where(sql<boolean>`"isAnonymous" is not true`)
    .execute()
  const row = await selectPeople(db).where('id', '=', userId).executeTakeFirst()
  return row && toPerson(row)
}

/** Guests whose login has run out have nothing to come back to; what they wrote stays under their member id. */
export async function deleteStaleGuests(db: Connection): Promise<number> {
  const { numDeletedRows } = await db
    .deleteFrom('user')
    .where('isAnonymous', '=', true)
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(
          selectFrom('session')
            .select('session.id')
            .whereRef('session.userId', '=', 'user.id')
            .where('expiresAt', '>', new Date()),
        ),
      ),
    )
    .executeTakeFirst()
  return Number(numDeletedRows)
}

/** Logins and links whose time is over. */
export async function deleteExpiredLogins(db: Connection): Promise<void> {
  await db.deleteFrom('session').where('expiresAt', '<', new Date()).execute()
  await db.deleteFrom('verification').where('expiresAt', '<', new Date()).execute()
}
