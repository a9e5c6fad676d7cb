import { sql, type Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { CourseTable } from '@/db/schema/courses'
import type { CourseRole } from '@/shared/api/fields'

/** A person is in few courses; past this many the oldest are left out. */
export const MAX_COURSES_LISTED = 200

export type CourseRow = Selectable<CourseTable>

/** A course as one person sees it. */
export type CourseView = CourseRow &
  Readonly<{
    /** Null for an administrator who is no member. */
    role: CourseRole | null
    members: number
    lessons: number
    openLesson: Readonly<{ id: string; title: string }> | null
  }>

const selectViews = (db: Connection, userId: string) =>
  db
    .selectFrom('course')
    .leftJoin('courseMember as mine', (join) =>
      join.onRef('mine.courseId', '=', 'course.id').on('mine.userId', '=', userId),
    )
    .selectAll('course')
    .select('mine.role')
    .select(({ selectFrom }) => [
      selectFrom('courseMember')
        .select(({ fn }) => fn.countAll<string>().as('count'))
        .whereRef('courseMember.courseId', '=', 'course.id')
        .as('members'),
      selectFrom('lesson')
        .select(({ fn }) => fn.countAll<string>().as('count'))
        .whereRef('lesson.courseId', '=', 'course.id')
        .where(({ eb, or }) =>
          // Students are not told of what is still being prepared.
          or([
            eb('lesson.status', '<>', 'prepared'),
            sql<boolean>`${sql.ref('mine.role')} is distinct from 'student'`,
          ]),
        )
        .as('lessons'),
      selectFrom('lesson')
        .select(
          sql<{ id: string; title: string }>`json_build_object('id', lesson.id, 'title', lesson.title)`.as(
            'it',
          ),
        )
        .whereRef('lesson.courseId', '=', 'course.id')
        .where('lesson.status', '=', 'open')
        .orderBy('lesson.openedAt', 'desc')
        .limit(1)
        .as('openLesson'),
    ])

type ViewRow = Awaited<ReturnType<ReturnType<typeof selectViews>['execute']>>[number]

const toView = ({ members, lessons, ...row }: ViewRow): CourseView => ({
  ...row,
  members: Number(members),
  lessons: Number(lessons),
})

/** The courses a person is in, newest first; with `isEveryone`, all there are. */
export async function listCourses(
  db: Connection,
  userId: string,
  { isEveryone }: Readonly<{ isEveryone: boolean }>,
): Promise<readonly CourseView[]> {
  const rows = await selectViews(db, userId)
    .$if(!isEveryone, (query) => query.where('mine.role', 'is not', null))
    .orderBy('course.isArchived')
    .orderBy('course.createdAt', 'desc')
    .orderBy('course.id')
    .limit(MAX_COURSES_LISTED)
    .execute()
  return rows.map(toView)
}

export async function findCourse(
  db: Connection,
  courseId: string,
  userId: string,
): Promise<CourseView | undefined> {
  const row = await selectViews(db, userId).where('course.id', '=', courseId).executeTakeFirst()
  return row && toView(row)
}

/** Makes a course with its first teacher. */
export async function insertCourse(
  db: Connection,
  { name, teacherId, id = createId() }: Readonly<{ name: string; teacherId: string; id?: string }>,
): Promise<string> {
  await db.transaction().execute(async (trx) => {
    await trx.insertInto('course').values({ id, name }).execute()
    await trx
      .insertInto('courseMember')
      .values({ courseId: id, userId: teacherId, role: 'teacher' })
      .execute()
  })
  return id
}

export async function updateCourse(
  db: Connection,
  courseId: string,
  changes: Readonly<{ name?: string | undefined; isArchived?: boolean | undefined }>,
): Promise<void> {
  if (changes.name === undefined && changes.isArchived === undefined) return
  await db.updateTable('course').set(changes).where('id', '=', courseId).execute()
}
