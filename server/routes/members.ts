import { changeCourseMember, findCourseMember, listCourseMembers } from '@/db/queries/course-members'
import { listLiveMemberships, updateLessonMember } from '@/db/queries/lesson-members'
import { accountOf } from '@/server/auth/asker'
import { courseFor } from '@/server/courses/access'
import { toMember } from '@/server/courses/course-reply'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { canInCourse } from '@/shared/api/course-acts'
import { courses } from '@/shared/api/courses'
import type { CourseRole } from '@/shared/api/fields'
import { askerOf, type Context } from './context'

export function createMemberRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db } = context

  /** Carries a change of role into the lessons that are going on. */
  async function changeMember(courseId: string, userId: string, role: CourseRole | null): Promise<void> {
    const outcome = await changeCourseMember(db, courseId, userId, role)
    if (outcome === 'not-a-member') throw new Refused('not-found')
    if (outcome === 'last-teacher') {
      throw new Refused('conflict', { fields: [{ path: 'role', code: 'last-teacher' }] })
    }
    for (const membership of await listLiveMemberships(db, courseId, userId)) {
      if (role !== null) await updateLessonMember(db, membership.id, { role })
      await context.realtime().memberChanged(membership.lessonId, membership.id)
    }
  }

  on(courses.members, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId } = asked.params
    const { standing } = await courseFor(db, person, courseId, 'see members')
    const hasEmails = canInCourse(standing, 'see addresses')
    const page = await listCourseMembers(db, courseId, { ...asked.query, hasEmails })
    return { ...page, items: page.items.map((member) => toMember(member, hasEmails)) }
  })

  on(courses.updateMember, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId, userId } = asked.params
    await courseFor(db, person, courseId, 'change members')
    await changeMember(courseId, userId, asked.body.role)
    return { member: toMember(found(await findCourseMember(db, courseId, userId)), true) }
  })

  on(courses.removeMember, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId, userId } = asked.params
    // Whoever wants to may leave.
    await courseFor(db, person, courseId, userId === person.id ? 'see course' : 'change members')
    await changeMember(courseId, userId, null)
    return {}
  })

  return router
}
