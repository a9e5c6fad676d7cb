import type { Connection } from '@/db/connect'
import { findCourseRole } from '@/db/queries/course-members'
import { findLessonMember, type LessonMember } from '@/db/queries/lesson-members'
import { findLesson, type LessonRow } from '@/db/queries/lessons'
import type { Asker } from '@/server/auth/asker'
import type { CourseStanding } from '@/shared/api/course-acts'
import type { LessonRole } from '@/shared/api/lessons'

/** What an asker is in one lesson, and what is known of them there. */
export type Standing = Readonly<{
  lesson: LessonRow
  /** `administrator` looks in from outside and has no part in it. */
  role: LessonRole | 'administrator'
  course: CourseStanding | null
  /** Null for a wall, and for those who have not entered yet. */
  member: LessonMember | null
}>

const LEADERS: readonly (CourseStanding | null)[] = ['teacher', 'assistant']

/**
 * Finds what an asker is in a lesson; null when they must not know that it exists. A wall's cookie counts before a
 * student's login and after a teacher's: a screen that may only show stays one, whoever is signed in on its machine.
 */
export async function findStanding(db: Connection, lessonId: string, asker: Asker): Promise<Standing | null> {
  const lesson = await findLesson(db, lessonId)
  if (!lesson) return null
  const { person, wall } = asker
  const courseRole = person && !person.isGuest ? await findCourseRole(db, lesson.courseId, person.id) : null
  const member = person ? ((await findLessonMember(db, lessonId, person.id)) ?? null) : null
  if (courseRole && LEADERS.includes(courseRole)) {
    return { lesson, role: courseRole, course: courseRole, member }
  }
  if (wall?.lessonId === lessonId) return { lesson, role: 'wall', course: null, member: null }
  if (courseRole === 'student') {
    // What is still being prepared is the teacher's.
    return lesson.status === 'prepared' ? null : { lesson, role: 'student', course: 'student', member }
  }
  if (member?.role === 'guest') return { lesson, role: 'guest', course: null, member }
  if (person?.isAdministrator) return { lesson, role: 'administrator', course: 'administrator', member: null }
  return null
}
