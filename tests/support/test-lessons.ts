import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import { insertLesson } from '@/db/queries/lessons'
import { createBoardDocument } from '@/realtime/journal/create-board-document'
import { openWithFreshCode } from '@/server/lessons/open-lesson'
import { testExercise, testStage } from './test-exercise'

export async function insertPreparedLesson(
  db: Connection,
  courseId: string,
  createdBy: string,
): Promise<string> {
  const id = createId()
  await db.transaction().execute(async (trx) => {
    await insertLesson(trx, { id, courseId, title: 'A lesson', createdBy })
    await createBoardDocument(trx, id, testExercise(), testStage())
  })
  return id
}

export async function insertOpenLesson(
  db: Connection,
  courseId: string,
  createdBy: string,
): Promise<{ id: string; code: string }> {
  const id = await insertPreparedLesson(db, courseId, createdBy)
  await openWithFreshCode(db, id)
  const { code } = await db.selectFrom('lesson').select('code').where('id', '=', id).executeTakeFirstOrThrow()
  return { id, code: code ?? '' }
}
