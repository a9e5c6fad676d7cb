import type { LessonRow } from '@/db/queries/lessons'
import type { Lesson } from '@/shared/api/lessons'
import type { Standing } from './find-standing'

/** Those who may tell the code to others. */
const TOLD_CODE: readonly Standing['role'][] = ['teacher', 'assistant', 'wall']

export const toLesson = (lesson: LessonRow, role: Standing['role']): Lesson => ({
  id: lesson.id,
  courseId: lesson.courseId,
  courseName: lesson.courseName,
  title: lesson.title,
  status: lesson.status,
  isDoorOpen: lesson.isDoorOpen,
  code: TOLD_CODE.includes(role) ? lesson.code : null,
  createdAt: lesson.createdAt.toISOString(),
  openedAt: lesson.openedAt?.toISOString() ?? null,
  endedAt: lesson.endedAt?.toISOString() ?? null,
})
