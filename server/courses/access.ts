import type { Connection } from '@/db/connect'
import { findCourse, type CourseView } from '@/db/queries/courses'
import type { Person } from '@/server/auth/asker'
import { found, Refused } from '@/server/errors/refused'
import { canInCourse, type CourseAct, type CourseStanding } from '@/shared/api/course-acts'

export const standingIn = (course: CourseView, person: Person): CourseStanding | null =>
  course.role ?? (person.isAdministrator ? 'administrator' : null)

/** The course, if `person` may do `act` in it. To those outside it does not exist. */
export async function courseFor(
  db: Connection,
  person: Person,
  courseId: string,
  act: CourseAct,
): Promise<{ course: CourseView; standing: CourseStanding }> {
  const course = found(await findCourse(db, courseId, person.id))
  const standing = found(standingIn(course, person))
  if (!canInCourse(standing, act)) throw new Refused('forbidden')
  return { course, standing }
}
