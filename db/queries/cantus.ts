import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { CantusTable } from '@/db/schema/cantus'
import type { CantusBody } from '@/shared/api/cantus'
import { readingOrder } from './search-text'

export const MAX_CANTUS_LISTED = 500

export type CantusRow = Selectable<CantusTable>

/** The library, one's own, and what is shared with a course that one leads. */
const selectVisible = (db: Connection, userId: string) =>
  db
    .selectFrom('cantus')
    .selectAll()
    .where(({ eb, or, and, exists, selectFrom }) =>
      or([
        and([eb('ownerId', 'is', null), eb('courseId', 'is', null)]),
        eb('ownerId', '=', userId),
        exists(
          selectFrom('courseMember')
            .select('userId')
            .whereRef('courseMember.courseId', '=', 'cantus.courseId')
            .where('courseMember.userId', '=', userId)
            .where('courseMember.role', 'in', ['teacher', 'assistant']),
        ),
      ]),
    )

export const listCantus = (db: Connection, userId: string): Promise<CantusRow[]> =>
  selectVisible(db, userId)
    .orderBy('origin', 'desc')
    .orderBy(readingOrder('title'))
    .orderBy('id')
    .limit(MAX_CANTUS_LISTED)
    .execute()

export const findCantus = (
  db: Connection,
  cantusId: string,
  userId: string,
): Promise<CantusRow | undefined> => selectVisible(db, userId).where('id', '=', cantusId).executeTakeFirst()

export const countOwnCantus = async (db: Connection, userId: string): Promise<number> => {
  const { count } = await db
    .selectFrom('cantus')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where('ownerId', '=', userId)
    .executeTakeFirstOrThrow()
  return Number(count)
}

export const insertCantus = (
  db: Connection,
  ownerId: string,
  { notes, ...written }: CantusBody,
): Promise<CantusRow> =>
  db
    .insertInto('cantus')
    .values({ id: createId(), origin: 'own', ownerId, notes: JSON.stringify(notes), ...written })
    .returningAll()
    .executeTakeFirstOrThrow()

export const updateCantus = (
  db: Connection,
  cantusId: string,
  { notes, ...written }: CantusBody,
): Promise<CantusRow> =>
  db
    .updateTable('cantus')
    .set({ notes: JSON.stringify(notes), ...written })
    .where('id', '=', cantusId)
    .returningAll()
    .executeTakeFirstOrThrow()

export const deleteCantus = (db: Connection, cantusId: string) =>
  db.deleteFrom('cantus').where('id', '=', cantusId).execute()
