import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import type { LessonTable } from '@/db/schema/lessons'

export const MAX_LESSONS_LISTED = 200

export type LessonRow = Selectable<LessonTable> & Readonly<{ courseName: string; isCourseArchived: boolean }>

const selectLessons = (db: Connection) =>
  db
    .selectFrom('lesson')
    .innerJoin('course', 'course.id', 'lesson.courseId')
    .selectAll('lesson')
    .select(['course.name as courseName', 'course.isArchived as isCourseArchived'])

export const findLesson = (db: Connection, lessonId: string): Promise<LessonRow | undefined> =>
  selectLessons(db).where('lesson.id', '=', lessonId).executeTakeFirst()

/** The open lesson of a code whose door is open. Unknown, ended and closed are one and the same: nothing. */
export const findLessonByCode = (db: Connection, code: string): Promise<LessonRow | undefined> =>
  selectLessons(db)
    .where('code', '=', code)
    .where('status', '=', 'open')
    .where('isDoorOpen', '=', true)
    .executeTakeFirst()

/** Open lessons first, then prepared ones, then those that ended; the newest of each first. */
export const listLessons = (
  db: Connection,
  courseId: string,
  { hasPrepared }: Readonly<{ hasPrepared: boolean }>,
): Promise<LessonRow[]> =>
  selectLessons(db)
    .where('lesson.courseId', '=', courseId)
    .$if(!hasPrepared, (query) => query.where('status', '<>', 'prepared'))
    .orderBy(({ eb }) =>
      eb.case().when('status', '=', 'open').then(0).when('status', '=', 'prepared').then(1).else(2).end(),
    )
    .orderBy('lesson.createdAt', 'desc')
    .orderBy('lesson.id')
    .limit(MAX_LESSONS_LISTED)
    .execute()

export const insertLesson = (
  db: Connection,
  lesson: Readonly<{ id: string; courseId: string; title: string; createdBy: string }>,
) =>
  db
    .insertInto('lesson')
    .values({ status: 'prepared', ...lesson })
    .execute()

export async function updateLesson(
  db: Connection,
  lessonId: string,
  changes: Readonly<{ title?: string | undefined; isDoorOpen?: boolean | undefined }>,
): Promise<void> {
  if (changes.title === undefined && changes.isDoorOpen === undefined) return
  await db.updateTable('lesson').set(changes).where('id', '=', lessonId).execute()
}

const UNIQUE_VIOLATION = '23505'

/** Opens a lesson under `code`; says whether the code was free. A lesson that is open already keeps its own. */
export async function openLesson(db: Connection, lessonId: string, code: string): Promise<boolean> {
  try {
    await db
      .updateTable('lesson')
      .set({ status: 'open', isDoorOpen: true, code, openedAt: new Date(), endedAt: null })
      .where('id', '=', lessonId)
      .where('status', '<>', 'open')
      .execute()
    return true
  } catch (error) {
    if ((error as { code?: string }).code === UNIQUE_VIOLATION) return false
    throw error
  }
}

export const endLesson = (db: Connection, lessonId: string) =>
  db
    .updateTable('lesson')
    .set({ status: 'ended', code: null, endedAt: new Date() })
    .where('id', '=', lessonId)
    .where('status', '=', 'open')
    .execute()

export const deleteLesson = (db: Connection, lessonId: string) =>
  db.deleteFrom('lesson').where('id', '=', lessonId).execute()
