import type { ColumnType, Generated } from 'kysely'
import type { CourseRole } from '@/shared/api/fields'

type Created = ColumnType<Date, Date | undefined, never>

export interface CourseTable {
  id: string
  name: string
  isArchived: Generated<boolean>
  createdAt: Created
}

export interface CourseMemberTable {
  courseId: string
  userId: string
  role: CourseRole
  joinedAt: Created
}

/** `email`: for one address, spent when taken. `link`: for whoever holds it, until it expires or is withdrawn. */
export interface InvitationTable {
  id: string
  courseId: string
  kind: 'email' | 'link'
  email: string | null
  role: CourseRole
  /** SHA-256 of the token in the link; the token itself is kept nowhere. */
  tokenHash: string
  invitedBy: string | null
  createdAt: Created
  expiresAt: ColumnType<Date, Date, Date>
}
