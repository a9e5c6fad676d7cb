import type { Selectable } from 'kysely'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { InvitationTable } from '@/db/schema/courses'
import type { CourseRole } from '@/shared/api/fields'

export const MAX_INVITATIONS_LISTED = 500

export type InvitationRow = Selectable<InvitationTable>

type NewInvitation = Readonly<{
  courseId: string
  role: CourseRole
  tokenHash: string
  invitedBy: string
  expiresAt: Date
}>

/** Invitations that can still be taken, newest first. */
export const listInvitations = (db: Connection, courseId: string): Promise<InvitationRow[]> =>
  db
    .selectFrom('invitation')
    .selectAll()
    .where('courseId', '=', courseId)
    .where('expiresAt', '>', new Date())
    .orderBy('createdAt', 'desc')
    .orderBy('id')
    .limit(MAX_INVITATIONS_LISTED)
    .execute()

export const insertLinkInvitation = (db: Connection, invitation: NewInvitation): Promise<InvitationRow> =>
  db
    .insertInto('invitation')
    .values({ id: createId(), kind: 'link', email: null, ...invitation })
    .returningAll()
    .executeTakeFirstOrThrow()

/** One address has one invitation a course: inviting again replaces it, and the older link no longer works. */
export const upsertEmailInvitation = (
  db: Connection,
  invitation: NewInvitation & Readonly<{ email: string }>,
): Promise<InvitationRow> =>
  db
    .insertInto('invitation')
    .values({ id: createId(), kind: 'email', ...invitation })
    .onConflict((conflict) =>
      conflict.columns(['courseId', 'email']).doUpdateSet({
        role: invitation.role,
        tokenHash: invitation.tokenHash,
        invitedBy: invitation.invitedBy,
        expiresAt: invitation.expiresAt,
      }),
    )
    .returningAll()
    .executeTakeFirstOrThrow()

/** What a link's token leads to while it lasts: the invitation, its course, and who asked. */
export const findInvitation = (db: Connection, tokenHash: string) =>
  db
    .selectFrom('invitation')
    .innerJoin('course', 'course.id', 'invitation.courseId')
    .leftJoin('user', 'user.id', 'invitation.invitedBy')
    .selectAll('invitation')
    .select(['course.name as courseName', 'course.isArchived', 'user.name as inviterName'])
    .where('tokenHash', '=', tokenHash)
    .where('expiresAt', '>', new Date())
    .executeTakeFirst()

export async function deleteInvitation(
  db: Connection,
  courseId: string,
  invitationId: string,
): Promise<boolean> {
  const { numDeletedRows } = await db
    .deleteFrom('invitation')
    .where('courseId', '=', courseId)
    .where('id', '=', invitationId)
    .executeTakeFirst()
  return numDeletedRows === 1n
}

export const deleteExpiredInvitations = (db: Connection) =>
  db.deleteFrom('invitation').where('expiresAt', '<', new Date()).execute()
