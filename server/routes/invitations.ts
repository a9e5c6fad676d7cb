import { insertCourseMember } from '@/db/queries/course-members'
import {
  deleteInvitation,
  findInvitation,
  insertLinkInvitation,
  listInvitations,
} from '@/db/queries/invitations'
import { accountOf } from '@/server/auth/asker'
import { createToken, hashToken } from '@/server/auth/token'
import { courseFor } from '@/server/courses/access'
import { toInvitation } from '@/server/courses/course-reply'
import { INVITATION_MS, invitationUrl, inviteMany } from '@/server/courses/invite'
import { found, Refused } from '@/server/errors/refused'
import { originFor } from '@/server/http/client-source'
import { createRouter } from '@/server/http/create-router'
import { courses } from '@/shared/api/courses'
import { askerOf, type Context } from './context'

export function createInvitationRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db, config } = context

  const openInvitation = async (token: string) => {
    const invitation = found(await findInvitation(db, hashToken(token)))
    if (invitation.isArchived) throw new Refused('ended')
    return invitation
  }

  on(courses.invitations, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    await courseFor(db, person, asked.params.courseId, 'invite')
    const list = await listInvitations(db, asked.params.courseId)
    return { invitations: list.map((invitation) => toInvitation(invitation)) }
  })

  on(courses.inviteMany, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { course } = await courseFor(db, person, asked.params.courseId, 'invite')
    if (course.isArchived) throw new Refused('conflict')
    return inviteMany(context, person, course, asked.body)
  })

  on(courses.createLink, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { course } = await courseFor(db, person, asked.params.courseId, 'invite')
    if (course.isArchived) throw new Refused('conflict')
    const waitMs = await context.limits.takeInvitation(course.id)
    if (waitMs > 0) throw new Refused('too-many-tries', { retryAfterSeconds: Math.ceil(waitMs / 1000) })
    const token = createToken()
    const invitation = await insertLinkInvitation(db, {
      courseId: course.id,
      role: asked.body.role,
      tokenHash: hashToken(token),
      invitedBy: person.id,
      expiresAt: new Date(Date.now() + INVITATION_MS),
    })
    return { invitation: toInvitation(invitation, invitationUrl(originFor(asked.request, config), token)) }
  })

  on(courses.withdrawInvitation, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId, invitationId } = asked.params
    await courseFor(db, person, courseId, 'invite')
    if (!(await deleteInvitation(db, courseId, invitationId))) throw new Refused('not-found')
    return {}
  })

  on(courses.peekInvitation, async (asked) => {
    const { courseName, role, inviterName, email } = await openInvitation(asked.params.token)
    return { courseName, role, invitedBy: inviterName ?? '', email }
  })

  on(courses.acceptInvitation, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const invitation = await openInvitation(asked.params.token)
    if (!person.isVerified) throw new Refused('address-unverified')
    // A forwarded message does not let its reader in: the invitation is for the address it was sent to.
    if (invitation.email !== null && invitation.email !== person.email) throw new Refused('forbidden')
    await insertCourseMember(db, { courseId: invitation.courseId, userId: person.id, role: invitation.role })
    if (invitation.kind === 'email') await deleteInvitation(db, invitation.courseId, invitation.id)
    return { courseId: invitation.courseId }
  })

  return router
}
