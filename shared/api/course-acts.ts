import type { CourseRole } from './fields'

/** Somebody's part in a course. An administrator who is no member looks after it without teaching in it. */
export type CourseStanding = CourseRole | 'administrator'

const STAFF: readonly CourseStanding[] = ['teacher', 'assistant']
const KEEPERS: readonly CourseStanding[] = ['teacher', 'administrator']

/** Every act on a course and who may do it. What may be done inside a lesson is in `shared/board`. */
const TABLE = {
  'see course': ['teacher', 'assistant', 'student', 'administrator'],
  'change course': KEEPERS,
  'see members': [...STAFF, 'administrator'],
  'see addresses': KEEPERS,
  'change members': KEEPERS,
  invite: KEEPERS,
  'see lessons': ['teacher', 'assistant', 'student', 'administrator'],
  'see prepared lessons': [...STAFF, 'administrator'],
  'prepare lesson': STAFF,
  'share cantus': STAFF,
  'share rule set': STAFF,
} as const satisfies Readonly<Record<string, readonly CourseStanding[]>>

export type CourseAct = keyof typeof TABLE

export const COURSE_ACTS = Object.keys(TABLE) as readonly CourseAct[]

export const canInCourse = (standing: CourseStanding, act: CourseAct): boolean =>
  (TABLE[act] as readonly CourseStanding[]).includes(standing)
