import { findCourseRole } from '@/db/queries/course-members'
import { findLessonMember, insertLessonMember, listLessonMembers } from '@/db/queries/lesson-members'
import { findLessonByCode, type LessonRow } from '@/db/queries/lessons'
import type { Person } from '@/server/auth/asker'
import { found, Refused } from '@/server/errors/refused'
import { sourceOf } from '@/server/http/client-source'
import { createRouter } from '@/server/http/create-router'
import { ENTRY_ERRORS } from '@/server/lessons/access'
import { enterLesson } from '@/server/lessons/enter-lesson'
import { findStanding } from '@/server/lessons/find-standing'
import { guestNameProblem } from '@/server/lessons/guest-name'
import { signInGuest } from '@/server/lessons/sign-in-guest'
import { lessonCodeSchema, lessons } from '@/shared/api/lessons'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import type { Request } from 'express'
import { askerOf, type Context } from './context'

export function createJoinRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db, limits } = context

  /** The lesson a code leads to. Unknown, ended and closed ones are refused alike, and counted as guesses alike. */
  async function lessonOfCode(request: Request, code: string): Promise<LessonRow> {
    if (!lessonCodeSchema.safeParse(code).success) throw new Refused('code-unknown')
    const { found: lesson, waitMs } = await limits.tryCode(sourceOf(request), () =>
      findLessonByCode(db, code),
    )
    if (waitMs > 0) throw new Refused('too-many-tries', { retryAfterSeconds: Math.ceil(waitMs / 1000) })
    if (!lesson) throw new Refused('code-unknown')
    return lesson
  }

  const isInCourse = async (lesson: LessonRow, person: Person | null) =>
    person !== null && !person.isGuest && (await findCourseRole(db, lesson.courseId, person.id)) !== null

  async function assertName(lesson: LessonRow, name: string | undefined): Promise<string> {
    if (name === undefined) throw new Refused('invalid', { fields: [{ path: 'name', code: 'empty' }] })
    const members = await listLessonMembers(db, lesson.id)
    const leaders = members.filter(({ role }) => role === 'teacher' || role === 'assistant')
    const problem = guestNameProblem(
      name,
      leaders.map((leader) => leader.name),
    )
    if (problem) throw new Refused('name-refused', { fields: [problem] })
    return name
  }

  on(lessons.peek, async (asked) => {
    const lesson = await lessonOfCode(asked.request, asked.params.code)
    const { person } = await askerOf(context, asked)
    return { title: lesson.title, needsName: !(await isInCourse(lesson, person)) }
  })

  on(lessons.join, async (asked) => {
    const { code, name } = asked.body
    const lesson = await lessonOfCode(asked.request, code)
    const { person } = await askerOf(context, asked)

    if (person && (await isInCourse(lesson, person))) {
      const standing = found(await findStanding(db, lesson.id, { person, wall: null }))
      const entered = await enterLesson(db, standing, person)
      if (!entered.ok) throw new Refused(ENTRY_ERRORS[entered.reason])
      if (!standing.member) context.realtime().rosterChanged(lesson.id)
      return { lessonId: lesson.id, memberId: found(entered.value.memberId), name: entered.value.name }
    }

    const known = person && (await findLessonMember(db, lesson.id, person.id))
    if (known?.isRemoved) throw new Refused('forbidden')
    // The same phone comes back. Under another name it is another guest: phones are handed on.
    if (known && (name === undefined || name === known.name)) {
      return { lessonId: lesson.id, memberId: known.id, name: known.name }
    }

    const guestName = await assertName(lesson, name)
    // An account from outside the course enters as a guest of its own.
    const userId =
      person && !person.isGuest
        ? person.id
        : await signInGuest(context, asked, { name: guestName, old: person })
    const made = await insertLessonMember(
      db,
      { lessonId: lesson.id, userId, name: guestName, role: 'guest' },
      WIRE_LIMITS.membersALesson,
    )
    if (made === 'full') throw new Refused('lesson-full')
    if (made === 'gone') throw new Refused('code-unknown')
    context.realtime().rosterChanged(lesson.id)
    return { lessonId: lesson.id, memberId: made.id, name: made.name }
  })

  return router
}
