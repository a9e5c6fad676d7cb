import { z } from 'zod'
import { endpoint } from './endpoint'
import { courseRoleSchema, emailSchema, idSchema, pageOf, pageQuerySchema, titleSchema } from './fields'

export const MAX_PASTED_CHARACTERS = 20_000
export const MAX_INVITATIONS_AT_ONCE = 200

export const courseSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  isArchived: z.boolean(),
  /** The asking person's role; an administrator who is no member has `administrator`. */
  myRole: z.enum(['teacher', 'assistant', 'student', 'administrator']),
  members: z.int(),
  lessons: z.int(),
  /** Title and id of a lesson that is open now, if any. */
  openLesson: z.strictObject({ id: idSchema, title: z.string() }).nullable(),
  createdAt: z.string(),
})
export type Course = z.infer<typeof courseSchema>

export const memberSchema = z.strictObject({
  userId: idSchema,
  name: z.string(),
  /** Told to teachers and administrators only. */
  email: z.string().nullable(),
  role: courseRoleSchema,
  joinedAt: z.string(),
})
export type Member = z.infer<typeof memberSchema>

export const invitationSchema = z.strictObject({
  id: idSchema,
  kind: z.enum(['email', 'link']),
  email: z.string().nullable(),
  role: courseRoleSchema,
  createdAt: z.string(),
  expiresAt: z.string(),
  /** Only in the answer that made a link: it is shown once. */
  url: z.string().nullable(),
})
export type Invitation = z.infer<typeof invitationSchema>

const courseReply = z.strictObject({ course: courseSchema })

export const courses = {
  list: endpoint({
    method: 'GET',
    path: '/api/courses',
    reply: z.strictObject({ courses: z.array(courseSchema) }),
  }),
  create: endpoint({
    method: 'POST',
    path: '/api/courses',
    body: z.strictObject({ name: titleSchema }),
    reply: courseReply,
  }),
  get: endpoint({ method: 'GET', path: '/api/courses/:courseId', reply: courseReply }),
  update: endpoint({
    method: 'PATCH',
    path: '/api/courses/:courseId',
    body: z.strictObject({ name: titleSchema.optional(), isArchived: z.boolean().optional() }),
    reply: courseReply,
  }),
  members: endpoint({
    method: 'GET',
    path: '/api/courses/:courseId/members',
    query: pageQuerySchema.extend({
      sort: z.enum(['name', 'role', 'joined']).default('name'),
      direction: z.enum(['up', 'down']).default('up'),
    }),
    reply: pageOf(memberSchema),
  }),
  updateMember: endpoint({
    method: 'PATCH',
    path: '/api/courses/:courseId/members/:userId',
    body: z.strictObject({ role: courseRoleSchema }),
    reply: z.strictObject({ member: memberSchema }),
  }),
  removeMember: endpoint({
    method: 'DELETE',
    path: '/api/courses/:courseId/members/:userId',
    reply: z.strictObject({}),
  }),
  invitations: endpoint({
    method: 'GET',
    path: '/api/courses/:courseId/invitations',
    reply: z.strictObject({ invitations: z.array(invitationSchema) }),
  }),
  /** Pasted addresses, in any of the forms people paste: lines, commas, semicolons, `Name <address>`. */
  inviteMany: endpoint({
    method: 'POST',
    path: '/api/courses/:courseId/invitations',
    body: z.strictObject({
      pasted: z.string().min(1, 'empty').max(MAX_PASTED_CHARACTERS, 'too-long'),
      role: courseRoleSchema,
    }),
    reply: z.strictObject({
      sent: z.array(emailSchema),
      already: z.array(emailSchema),
      refused: z.array(z.strictObject({ text: z.string(), why: z.enum(['not-an-address', 'mail-failed']) })),
    }),
  }),
  createLink: endpoint({
    method: 'POST',
    path: '/api/courses/:courseId/invitation-links',
    body: z.strictObject({ role: courseRoleSchema }),
    reply: z.strictObject({ invitation: invitationSchema }),
  }),
  withdrawInvitation: endpoint({
    method: 'DELETE',
    path: '/api/courses/:courseId/invitations/:invitationId',
    reply: z.strictObject({}),
  }),
  peekInvitation: endpoint({
    method: 'GET',
    path: '/api/invitations/:token',
    reply: z.strictObject({
      courseName: z.string(),
      role: courseRoleSchema,
      invitedBy: z.string(),
      email: z.string().nullable(),
    }),
  }),
  acceptInvitation: endpoint({
    method: 'POST',
    path: '/api/invitations/:token/accept',
    reply: z.strictObject({ courseId: idSchema }),
  }),
}
