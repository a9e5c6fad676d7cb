import { createId } from '@/db/create-id'
import { listLessonMembers } from '@/db/queries/lesson-members'
import {
  deleteLesson,
  endLesson,
  findLesson,
  insertLesson,
  listLessons,
  updateLesson,
} from '@/db/queries/lessons'
import { createBoardDocument } from '@/realtime/journal/create-board-document'
import { accountOf } from '@/server/auth/asker'
import { courseFor } from '@/server/courses/access'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { ENTRY_ERRORS, standingFor, standingToAct } from '@/server/lessons/access'
import { enterLesson } from '@/server/lessons/enter-lesson'
import { exerciseProblems } from '@/server/lessons/exercise-problems'
import { toLesson } from '@/server/lessons/lesson-reply'
import { openWithFreshCode } from '@/server/lessons/open-lesson'
import { stepLesson, type LessonStep } from '@/shared/board'
import { canInCourse } from '@/shared/api/course-acts'
import { lessons } from '@/shared/api/lessons'
import type { LessonRow } from '@/db/queries/lessons'
import type { Standing } from '@/server/lessons/find-standing'
import { askerOf, type Context } from './context'

export function createLessonRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db } = context

  /** Refuses a step that the lesson's life does not allow. */
  function assertStep({ status, isDoorOpen }: LessonRow, step: LessonStep): void {
    const life = status === 'open' ? { status, isDoorOpen } : { status }
    const stepped = stepLesson(life, step)
    if (!stepped.ok) throw new Refused(stepped.reason === 'ended' ? 'ended' : 'conflict')
  }

  const replyAfter = async ({ lesson, role }: Standing) => ({
    lesson: toLesson(found(await findLesson(db, lesson.id)), role),
  })

  on(lessons.list, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId } = asked.params
    const { standing } = await courseFor(db, person, courseId, 'see lessons')
    const list = await listLessons(db, courseId, {
      hasPrepared: canInCourse(standing, 'see prepared lessons'),
    })
    return { lessons: list.map((lesson) => toLesson(lesson, standing)) }
  })

  on(lessons.create, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId } = asked.params
    const { course, standing } = await courseFor(db, person, courseId, 'prepare lesson')
    if (course.isArchived) throw new Refused('conflict')
    const { title, exercise, stage } = asked.body
    const fields = exerciseProblems(exercise)
    if (fields.length > 0) throw new Refused('invalid', { fields })
    const lessonId = createId()
    await db.transaction().execute(async (trx) => {
      await insertLesson(trx, { id: lessonId, courseId, title, createdBy: person.id })
      await createBoardDocument(trx, lessonId, exercise, stage)
    })
    return { lesson: toLesson(found(await findLesson(db, lessonId)), standing) }
  })

  on(lessons.get, async (asked) => {
    const { lesson, role } = await standingFor(context, await askerOf(context, asked), asked.params.lessonId)
    return { lesson: toLesson(lesson, role) }
  })

  on(lessons.update, async (asked) => {
    const asker = await askerOf(context, asked)
    const { title, isDoorOpen } = asked.body
    const standing = await standingToAct(context, asker, asked.params.lessonId, 'rename lesson')
    if (isDoorOpen !== undefined) {
      await standingToAct(context, asker, standing.lesson.id, 'open door')
      assertStep(standing.lesson, isDoorOpen ? 'open door' : 'close door')
    }
    await updateLesson(db, standing.lesson.id, { title, isDoorOpen })
    context.realtime().lessonChanged(standing.lesson.id)
    return replyAfter(standing)
  })

  on(lessons.open, async (asked) => {
    const standing = await standingToAct(
      context,
      await askerOf(context, asked),
      asked.params.lessonId,
      'open lesson',
    )
    if (standing.lesson.isCourseArchived) throw new Refused('conflict')
    assertStep(standing.lesson, 'open')
    await openWithFreshCode(db, standing.lesson.id)
    context.realtime().lessonChanged(standing.lesson.id)
    return replyAfter(standing)
  })

  on(lessons.end, async (asked) => {
    const standing = await standingToAct(
      context,
      await askerOf(context, asked),
      asked.params.lessonId,
      'end lesson',
    )
    assertStep(standing.lesson, 'end')
    await endLesson(db, standing.lesson.id)
    await context.realtime().lessonEnded(standing.lesson.id)
    return replyAfter(standing)
  })

  on(lessons.remove, async (asked) => {
    const standing = await standingToAct(
      context,
      await askerOf(context, asked),
      asked.params.lessonId,
      'remove lesson',
    )
    // The rooms close first: nothing is written to a lesson whose rows are going.
    await endLesson(db, standing.lesson.id)
    await context.realtime().lessonEnded(standing.lesson.id)
    await deleteLesson(db, standing.lesson.id)
    return {}
  })

  on(lessons.enter, async (asked) => {
    const asker = await askerOf(context, asked)
    const standing = await standingFor(context, asker, asked.params.lessonId)
    const entered = await enterLesson(db, standing, asker.person)
    if (!entered.ok) throw new Refused(ENTRY_ERRORS[entered.reason])
    if (!standing.member && entered.value.memberId) context.realtime().rosterChanged(standing.lesson.id)
    return { lesson: toLesson(standing.lesson, standing.role), ...entered.value }
  })

  on(lessons.roster, async (asked) => {
    const standing = await standingToAct(
      context,
      await askerOf(context, asked),
      asked.params.lessonId,
      'see names',
    )
    const members = await listLessonMembers(db, standing.lesson.id)
    return {
      members: members.map(({ id, name, role, isRemoved }) => ({ memberId: id, name, role, isRemoved })),
    }
  })

  return router
}
