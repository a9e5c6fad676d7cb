import { sql } from 'kysely'
import type { Connection } from '@/db/connect'
import { PAGE_SIZE, type CourseRole } from '@/shared/api/fields'
import { pageFrom, type Page, type PageRequest } from './page'
import { foldedColumn, patternOf, readingOrder } from './search-text'

export type CourseMember = Readonly<{
  userId: string
  name: string
  email: string
  role: CourseRole
  joinedAt: Date
}>

export type MemberOrder = Readonly<{ sort: 'name' | 'role' | 'joined'; direction: 'up' | 'down' }>

const selectMembers = (db: Connection, courseId: string) =>
  db
    .selectFrom('courseMember')
    .innerJoin('user', 'user.id', 'courseMember.userId')
    .select(['courseMember.userId', 'user.name', 'user.email', 'courseMember.role', 'courseMember.joinedAt'])
    .where('courseMember.courseId', '=', courseId)

const ORDERS = {
  name: readingOrder('user.name'),
  role: sql`array_position(array['teacher', 'assistant', 'student'], "courseMember".role)`,
  joined: sql.ref('courseMember.joinedAt'),
}

export async function findCourseRole(
  db: Connection,
  courseId: string,
  userId: string,
): Promise<CourseRole | null> {
  const row = await db
    .selectFrom('courseMember')
    .select('role')
    .where('courseId', '=', courseId)
    .where('userId', '=', userId)
    .executeTakeFirst()
  return row?.role ?? null
}

export const findCourseMember = (
  db: Connection,
  courseId: string,
  userId: string,
): Promise<CourseMember | undefined> =>
  selectMembers(db, courseId).where('courseMember.userId', '=', userId).executeTakeFirst()

/** `hasEmails` says whether the search may look into addresses: who is not told them must not find by them. */
export async function listCourseMembers(
  db: Connection,
  courseId: string,
  {
    offset,
    search,
    sort,
    direction,
    hasEmails,
  }: PageRequest & MemberOrder & Readonly<{ hasEmails: boolean }>,
): Promise<Page<CourseMember>> {
  const pattern = patternOf(search)
  const byName = sql<boolean>`${foldedColumn('user.name')} like ${pattern}`
  const matching = hasEmails
    ? sql<boolean>`(${byName} or ${foldedColumn('user.email')} like ${pattern})`
    : byName
  const { count } = await db
    .selectFrom('courseMember')
    .innerJoin('user', 'user.id', 'courseMember.userId')
    .select(({ fn }) => fn.countAll<string>().as('count'))
    .where('courseMember.courseId', '=', courseId)
    .where(matching)
    .executeTakeFirstOrThrow()
  const items = await selectMembers(db, courseId)
    .where(matching)
    .orderBy(ORDERS[sort], direction === 'up' ? 'asc' : 'desc')
    .orderBy(readingOrder('user.name'))
    .orderBy('courseMember.userId')
    .offset(offset)
    .limit(PAGE_SIZE)
    .execute()
  return pageFrom(items, Number(count), offset)
}

/** Puts a person into a course. Who is in it already keeps their role: an invitation never takes one away. */
export async function insertCourseMember(
  db: Connection,
  member: Readonly<{ courseId: string; userId: string; role: CourseRole }>,
): Promise<boolean> {
  const { numInsertedOrUpdatedRows } = await db
    .insertInto('courseMember')
    .values(member)
    .onConflict((conflict) => conflict.columns(['courseId', 'userId']).doNothing())
    .executeTakeFirst()
  return numInsertedOrUpdatedRows === 1n
}

/** Those of `emails` that belong to members. */
export async function listMemberEmails(
  db: Connection,
  courseId: string,
  emails: readonly string[],
): Promise<readonly string[]> {
  if (emails.length === 0) return []
  const rows = await db
    .selectFrom('courseMember')
    .innerJoin('user', 'user.id', 'courseMember.userId')
    .select('user.email')
    .where('courseMember.courseId', '=', courseId)
    .where('user.email', 'in', emails)
    .execute()
  return rows.map(({ email }) => email)
}

/**
 * Changes a member's role, or takes the member out with `null`. Refuses to leave a course without a teacher; the
 * course's teachers are locked meanwhile, so that two who demote each other at once do not both succeed.
 */
export const changeCourseMember = (
  db: Connection,
  courseId: string,
  userId: string,
  role: CourseRole | null,
): Promise<'changed' | 'not-a-member' | 'last-teacher'> =>
  db.transaction().execute(async (trx) => {
    await trx.selectFrom('course').select('id').where('id', '=', courseId).forUpdate().execute()
    const old = await findCourseRole(trx, courseId, userId)
    if (!old) return 'not-a-member'
    if (old === 'teacher' && role !== 'teacher') {
      const teachers = await trx
        .selectFrom('courseMember')
        .select('userId')
        .where('courseId', '=', courseId)
        .where('role', '=', 'teacher')
        .execute()
      if (teachers.length === 1) return 'last-teacher'
    }
    const which = { courseId, userId }
    if (role === null) {
      await trx
        .deleteFrom('courseMember')
        .where('courseId', '=', which.courseId)
        .where('userId', '=', which.userId)
        .execute()
    } else {
      await trx
        .updateTable('courseMember')
        .set({ role })
        .where('courseId', '=', which.courseId)
        .where('userId', '=', which.userId)
        .execute()
    }
    return 'changed'
  })
