import { findCourse, insertCourse, listCourses, updateCourse } from '@/db/queries/courses'
import { accountOf } from '@/server/auth/asker'
import { courseFor } from '@/server/courses/access'
import { toCourse } from '@/server/courses/course-reply'
import { found, Refused } from '@/server/errors/refused'
import { createRouter } from '@/server/http/create-router'
import { courses } from '@/shared/api/courses'
import { askerOf, type Context } from './context'

export function createCourseRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db } = context

  on(courses.list, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const list = await listCourses(db, person.id, { isEveryone: person.isAdministrator })
    return { courses: list.map(toCourse) }
  })

  on(courses.create, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    if (!person.mayMakeCourses && !person.isAdministrator) throw new Refused('forbidden')
    if (!person.isVerified) throw new Refused('address-unverified')
    const courseId = await insertCourse(db, { name: asked.body.name, teacherId: person.id })
    return { course: toCourse(found(await findCourse(db, courseId, person.id))) }
  })

  on(courses.get, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { course } = await courseFor(db, person, asked.params.courseId, 'see course')
    return { course: toCourse(course) }
  })

  on(courses.update, async (asked) => {
    const person = accountOf(await askerOf(context, asked))
    const { courseId } = asked.params
    await courseFor(db, person, courseId, 'change course')
    await updateCourse(db, courseId, asked.body)
    return { course: toCourse(found(await findCourse(db, courseId, person.id))) }
  })

  return router
}
