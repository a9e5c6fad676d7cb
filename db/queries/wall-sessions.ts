import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'

export const findWallSession = (db: Connection, tokenHash: string) =>
  db
    .selectFrom('wallSession')
    .select(['id', 'lessonId', 'linkId'])
    .where('tokenHash', '=', tokenHash)
    .where('expiresAt', '>', new Date())
    .executeTakeFirst()

/** Opens a wall with a link; a link that has opened one already opens no other. */
export async function insertWallSession(
  db: Connection,
  wall: Readonly<{ lessonId: string; tokenHash: string; linkId: string; openedBy: string; expiresAt: Date }>,
): Promise<boolean> {
  const { numInsertedOrUpdatedRows } = await db
    .insertInto('wallSession')
    .values({ id: createId(), ...wall })
    .onConflict((conflict) => conflict.column('linkId').doNothing())
    .executeTakeFirst()
  return numInsertedOrUpdatedRows === 1n
}

export const deleteExpiredWallSessions = (db: Connection) =>
  db.deleteFrom('wallSession').where('expiresAt', '<', new Date()).execute()
