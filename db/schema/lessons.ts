import type { ColumnType, Generated } from 'kysely'
import type { lessonStatusSchema, LessonRole } from '@/shared/api/lessons'
import type { z } from 'zod'

type Created = ColumnType<Date, Date | undefined, never>
type MaybeTime = ColumnType<Date | null, Date | null | undefined, Date | null>

export interface LessonTable {
  id: string
  courseId: string
  title: string
  status: z.infer<typeof lessonStatusSchema>
  isDoorOpen: Generated<boolean>
  /** Syllable code; there is one exactly while the lesson is open, and no two open lessons share one. */
  code: string | null
  createdBy: string | null
  createdAt: Created
  openedAt: MaybeTime
  endedAt: MaybeTime
}

/** Everyone who ever entered. `id` is the member id that documents, journal and class channel know. */
export interface LessonMemberTable {
  id: string
  lessonId: string
  /** Null when the account is gone; what the member wrote stays under the id. */
  userId: string | null
  name: string
  role: Exclude<LessonRole, 'wall'>
  /** Sent out by the teacher for good. */
  isRemoved: Generated<boolean>
  joinedAt: Created
}

/** A screen that may show one lesson and do nothing else. */
export interface WallSessionTable {
  id: string
  lessonId: string
  /** SHA-256 of the cookie. */
  tokenHash: string
  /** Id inside the link it was opened with: a link opens one wall. */
  linkId: string
  openedBy: string | null
  createdAt: Created
  expiresAt: ColumnType<Date, Date, Date>
}
