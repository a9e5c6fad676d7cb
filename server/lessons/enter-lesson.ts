import type { Connection } from '@/db/connect'
import { insertLessonMember, updateLessonMember, type LessonMember } from '@/db/queries/lesson-members'
import type { IdentityRefusal } from '@/realtime/contract'
import type { Person } from '@/server/auth/asker'
import type { LessonRole } from '@/shared/api/lessons'
import { fail, ok, type Result } from '@/shared/result'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import type { Standing } from './find-standing'

/** The name a wall goes by, where one has to be given. */
export const WALL_NAME = 'Wall'

export type Entered = Readonly<{ role: LessonRole; memberId: string | null; name: string }>
export type EntryRefusal = IdentityRefusal | 'door-closed'

/** A role in the course may have changed since the member entered: the course's word stands. */
async function withRole(
  db: Connection,
  member: LessonMember,
  role: LessonMember['role'],
): Promise<LessonMember> {
  if (member.role === role) return member
  await updateLessonMember(db, member.id, { role })
  return { ...member, role }
}

/** Lets an asker into a lesson as what they are, and makes them a member of it the first time. */
export async function enterLesson(
  db: Connection,
  { lesson, role, member }: Standing,
  person: Person | null,
): Promise<Result<Entered, EntryRefusal>> {
  if (role === 'administrator') return fail('forbidden')
  if (role === 'wall') return ok({ role, memberId: null, name: WALL_NAME })
  if (!person) return fail('signed-out')
  if (member?.isRemoved) return fail('removed')
  const isLeader = role === 'teacher' || role === 'assistant'
  if (lesson.status === 'ended' && !isLeader) return fail('lesson-ended')
  if (member) {
    const { id, name } = await withRole(db, member, role)
    return ok({ role, memberId: id, name })
  }
  if (role === 'guest') return fail('forbidden')
  if (!isLeader && !lesson.isDoorOpen) return fail('door-closed')
  const made = await insertLessonMember(
    db,
    { lessonId: lesson.id, userId: person.id, name: person.name, role },
    WIRE_LIMITS.membersALesson,
  )
  if (made === 'full') return fail('lesson-full')
  if (made === 'gone') return fail('not-found')
  return ok({ role, memberId: made.id, name: made.name })
}
