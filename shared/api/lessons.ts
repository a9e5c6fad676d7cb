import { z } from 'zod'
import { exerciseSchema, stageSchema } from '@/shared/wire/documents'
import { endpoint } from './endpoint'
import { idSchema, nameSchema, titleSchema } from './fields'

export const CODE_SYLLABLES = ['do', 're', 'mi', 'fa', 'sol', 'la', 'ti'] as const
export type Syllable = (typeof CODE_SYLLABLES)[number]
export const CODE_LENGTH = 6

/** A lesson's code as syllables joined by hyphens: `re-fa-mi-la-sol-do`. */
export const lessonCodeSchema = z
  .string()
  .regex(
    new RegExp(`^(${CODE_SYLLABLES.join('|')})(-(${CODE_SYLLABLES.join('|')})){${CODE_LENGTH - 1}}$`),
    'not-a-code',
  )

/** Roles inside a lesson. `wall` is a screen that may only show. */
export const lessonRoleSchema = z.enum(['teacher', 'assistant', 'student', 'guest', 'wall'])
export type LessonRole = z.infer<typeof lessonRoleSchema>

export const lessonStatusSchema = z.enum(['prepared', 'open', 'ended'])

export const lessonSchema = z.strictObject({
  id: idSchema,
  courseId: idSchema,
  courseName: z.string(),
  title: z.string(),
  status: lessonStatusSchema,
  /** Whether newcomers are let in by the code. */
  isDoorOpen: z.boolean(),
  /** Told to teacher, assistants and the wall while the lesson is open. */
  code: lessonCodeSchema.nullable(),
  createdAt: z.string(),
  openedAt: z.string().nullable(),
  endedAt: z.string().nullable(),
})
export type Lesson = z.infer<typeof lessonSchema>

const lessonReply = z.strictObject({ lesson: lessonSchema })

export const lessons = {
  list: endpoint({
    method: 'GET',
    path: '/api/courses/:courseId/lessons',
    reply: z.strictObject({ lessons: z.array(lessonSchema) }),
  }),
  /** Makes a prepared lesson with its board. */
  create: endpoint({
    method: 'POST',
    path: '/api/courses/:courseId/lessons',
    body: z.strictObject({ title: titleSchema, exercise: exerciseSchema, stage: stageSchema }),
    reply: lessonReply,
  }),
  get: endpoint({ method: 'GET', path: '/api/lessons/:lessonId', reply: lessonReply }),
  /** Renames it, or opens and closes the door to newcomers. */
  update: endpoint({
    method: 'PATCH',
    path: '/api/lessons/:lessonId',
    body: z.strictObject({ title: titleSchema.optional(), isDoorOpen: z.boolean().optional() }),
    reply: lessonReply,
  }),
  /** Opens a prepared lesson, or an ended one again, under a new code. */
  open: endpoint({ method: 'POST', path: '/api/lessons/:lessonId/open', reply: lessonReply }),
  end: endpoint({ method: 'POST', path: '/api/lessons/:lessonId/end', reply: lessonReply }),
  remove: endpoint({ method: 'DELETE', path: '/api/lessons/:lessonId', reply: z.strictObject({}) }),
  /** What the asking person, guest or wall is in this lesson; makes a student of the course a member of it. */
  enter: endpoint({
    method: 'POST',
    path: '/api/lessons/:lessonId/enter',
    reply: z.strictObject({
      lesson: lessonSchema,
      role: lessonRoleSchema,
      memberId: idSchema.nullable(),
      name: z.string(),
    }),
  }),
  /** Teacher and assistants: everyone who ever entered, to put names to member ids. */
  roster: endpoint({
    method: 'GET',
    path: '/api/lessons/:lessonId/roster',
    reply: z.strictObject({
      members: z.array(
        z.strictObject({
          memberId: idSchema,
          name: z.string(),
          role: lessonRoleSchema,
          isRemoved: z.boolean(),
        }),
      ),
    }),
  }),
  /** A short-lived address that turns the projector's own machine into this lesson's wall. */
  createWallLink: endpoint({
    method: 'POST',
    path: '/api/lessons/:lessonId/wall-links',
    reply: z.strictObject({ url: z.string(), expiresAt: z.string() }),
  }),
  /** Exchanges the token of a wall link for a cookie that can do nothing but show. */
  openWall: endpoint({
    method: 'POST',
    path: '/api/wall-sessions',
    body: z.strictObject({ token: z.string().min(20).max(200) }),
    reply: z.strictObject({ lessonId: idSchema }),
  }),
  /** Is there an open lesson of this code? Asked before a name is; answers alike for unknown and closed ones. */
  peek: endpoint({
    method: 'GET',
    path: '/api/join/:code',
    reply: z.strictObject({ title: z.string(), needsName: z.boolean() }),
  }),
  /** Enters by code: as oneself when signed in and a member of the course, else as a guest under `name`. */
  join: endpoint({
    method: 'POST',
    path: '/api/join',
    body: z.strictObject({ code: lessonCodeSchema, name: nameSchema.optional() }),
    reply: z.strictObject({ lessonId: idSchema, memberId: idSchema, name: z.string() }),
  }),
}
