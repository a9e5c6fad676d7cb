import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import type { AttemptTable } from '@/db/schema/attempts'

export type Attempt = Selectable<AttemptTable>

export const findAttempt = (db: Connection, key: string): Promise<Attempt | undefined> =>
  db.selectFrom('attempt').selectAll().where('key', '=', key).executeTakeFirst()

export const upsertAttempt = (db: Connection, { key, ...counted }: Attempt) =>
  db
    .insertInto('attempt')
    .values({ key, ...counted })
    .onConflict((conflict) => conflict.column('key').doUpdateSet(counted))
    .execute()

export const deleteAttempt = (db: Connection, key: string) =>
  db.deleteFrom('attempt').where('key', '=', key).execute()

export const deleteAttemptsBefore = (db: Connection, time: Date) =>
  db
    .deleteFrom('attempt')
    .where('windowStartedAt', '<', time)
    .where(({ eb, or }) => or([eb('lockedUntil', 'is', null), eb('lockedUntil', '<', new Date())]))
    .execute()
