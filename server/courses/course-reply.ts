import type { CourseView } from '@/db/queries/courses'
import type { InvitationRow } from '@/db/queries/invitations'
import type { CourseMember } from '@/db/queries/course-members'
import type { Course, Invitation, Member } from '@/shared/api/courses'

export const toCourse = ({ role, createdAt, ...course }: CourseView): Course => ({
  ...course,
  myRole: role ?? 'administrator',
  createdAt: createdAt.toISOString(),
})

export const toMember = (member: CourseMember, hasEmail: boolean): Member => ({
  userId: member.userId,
  name: member.name,
  email: hasEmail ? member.email : null,
  role: member.role,
  joinedAt: member.joinedAt.toISOString(),
})

export const toInvitation = (
  { id, kind, email, role, createdAt, expiresAt }: InvitationRow,
  url: string | null = null,
): Invitation => ({
  id,
  kind,
  email,
  role,
  createdAt: createdAt.toISOString(),
  expiresAt: expiresAt.toISOString(),
  url,
})
