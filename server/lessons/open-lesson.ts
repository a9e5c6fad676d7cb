import type { Connection } from '@/db/connect'
import { openLesson } from '@/db/queries/lessons'
import { createLessonCode } from './lesson-code'

const CODE_TRIES = 20

/** Opens a lesson under a code that no other open lesson has. */
export async function openWithFreshCode(
  db: Connection,
  lessonId: string,
  draw: () => string = createLessonCode,
): Promise<void> {
  for (let tries = 0; tries < CODE_TRIES; tries += 1) {
    if (await openLesson(db, lessonId, draw())) return
  }
  throw new Error(`No free code in ${CODE_TRIES} draws`)
}
