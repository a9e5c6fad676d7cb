import type { AccountTable, SessionTable, UserTable, VerificationTable } from './accounts'
import type { AttemptTable } from './attempts'
import type { CantusTable } from './cantus'
import type { CourseMemberTable, CourseTable, InvitationTable } from './courses'
import type { JournalChangeTable, JournalEventTable, JournalSnapshotTable } from './journal'
import type { RuleSetTable } from './rule-sets'
import type { LessonMemberTable, LessonTable, WallSessionTable } from './lessons'

/** Tables of the database as Kysely sees them; one file an aggregate. */
export interface Database {
  user: UserTable
  session: SessionTable
  account: AccountTable
  verification: VerificationTable
  course: CourseTable
  courseMember: CourseMemberTable
  invitation: InvitationTable
  cantus: CantusTable
  ruleSet: RuleSetTable
  lesson: LessonTable
  lessonMember: LessonMemberTable
  wallSession: WallSessionTable
  attempt: AttemptTable
  journalChange: JournalChangeTable
  journalEvent: JournalEventTable
  journalSnapshot: JournalSnapshotTable
}
