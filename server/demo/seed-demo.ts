import { hashPassword } from 'better-auth/crypto'
import type { Connection } from '@/db/connect'
import { DEMO_PASSWORD } from '@/db/demo/people'
import { DEMO_COURSE_ID, seedSchool } from '@/db/demo/seed-school'
import { findLesson, insertLesson } from '@/db/queries/lessons'
import { createBoardDocument } from '@/realtime/journal/create-board-document'
import { openWithFreshCode } from '@/server/lessons/open-lesson'
import { createDemoLessons } from './lessons'

/** Puts the demo in where it is missing. What people did to it since is left alone. */
export async function seedDemo(db: Connection): Promise<void> {
  const teacherId = await seedSchool(db, () => hashPassword(DEMO_PASSWORD))
  for (const { id, title, exercise, stage, isOpen } of createDemoLessons()) {
    if (await findLesson(db, id)) continue
    await db.transaction().execute(async (trx) => {
      await insertLesson(trx, { id, courseId: DEMO_COURSE_ID, title, createdBy: teacherId })
      await createBoardDocument(trx, id, exercise, stage)
    })
    if (isOpen) await openWithFreshCode(db, id)
  }
}
