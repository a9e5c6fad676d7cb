import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { LessonMemberTable } from '@/db/schema/lessons'

export type LessonMember = Selectable<LessonMemberTable>

export const findLessonMember = (
  db: Connection,
  lessonId: string,
  userId: string,
): Promise<LessonMember | undefined> =>
  db
    .selectFrom('lessonMember')
    .selectAll()
    .where('lessonId', '=', lessonId)
    .where('userId', '=', userId)
    .executeTakeFirst()

/** Everyone who ever entered, in the order they came. There are never more than a lesson may hold. */
export const listLessonMembers = (db: Connection, lessonId: string): Promise<LessonMember[]> =>
  db
    .selectFrom('lessonMember')
    .selectAll()
    .where('lessonId', '=', lessonId)
    .orderBy('joinedAt')
    .orderBy('id')
    .execute()

/**
 * Makes a person a member of a lesson, once, as long as it holds fewer than `most`. The lesson's row is locked
 * meanwhile, so that a crowd at the door is counted one by one.
 */
export const insertLessonMember = (
  db: Connection,
  member: Readonly<{ lessonId: string; userId: string; name: string; role: LessonMember['role'] }>,
  most: number,
): Promise<LessonMember | 'full' | 'gone'> =>
  db.transaction().execute(async (trx) => {
    const lesson = await trx
      .selectFrom('lesson')
      .select('id')
      .where('id', '=', member.lessonId)
      .forUpdate()
      .executeTakeFirst()
    if (!lesson) return 'gone'
    const known = await findLessonMember(trx, member.lessonId, member.userId)
    if (known) return known
    const { count } = await trx
      .selectFrom('lessonMember')
      .select(({ fn }) => fn.countAll<string>().as('count'))
      .where('lessonId', '=', member.lessonId)
      .executeTakeFirstOrThrow()
    if (Number(count) >= most) return 'full'
    return trx
      .insertInto('lessonMember')
      .values({ id: createId(), ...member })
      .returningAll()
      .executeTakeFirstOrThrow()
  })

export const updateLessonMember = (
  db: Connection,
  memberId: string,
  changes: Readonly<Partial<Pick<LessonMember, 'role' | 'isRemoved' | 'name'>>>,
) => db.updateTable('lessonMember').set(changes).where('id', '=', memberId).execute()

/** Memberships of a person in lessons of a course that have not ended. */
export const listLiveMemberships = (db: Connection, courseId: string, userId: string) =>
  db
    .selectFrom('lessonMember')
    .innerJoin('lesson', 'lesson.id', 'lessonMember.lessonId')
    .select(['lessonMember.id', 'lessonMember.lessonId', 'lessonMember.role'])
    .where('lesson.courseId', '=', courseId)
    .where('lesson.status', '<>', 'ended')
    .where('lessonMember.userId', '=', userId)
    .execute()

/** Hands a guest's memberships to the account they signed in to, where it has none of its own in that lesson. */
export const moveMemberships = (db: Connection, fromUserId: string, toUserId: string) =>
  db
    .updateTable('lessonMember')
    .set({ userId: toUserId })
    .where('userId', '=', fromUserId)
    .where(({ not, exists, selectFrom }) =>
      not(
        exists(
          selectFrom('lessonMember as other')
            .select('other.id')
            .whereRef('other.lessonId', '=', 'lessonMember.lessonId')
            .where('other.userId', '=', toUserId),
        ),
      ),
    )
    .execute()
