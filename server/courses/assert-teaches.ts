import type { Connection } from '@/db/connect'
import { listCourses } from '@/db/queries/courses'
import type { Person } from '@/server/auth/asker'
import { Refused } from '@/server/errors/refused'

/** Whoever leads a course, or may make one, may write what courses are taught with. */
export async function assertTeaches(db: Connection, person: Person): Promise<void> {
  if (person.mayMakeCourses || person.isAdministrator) return
  const courses = await listCourses(db, person.id, { isEveryone: false })
  if (!courses.some(({ role }) => role === 'teacher' || role === 'assistant')) throw new Refused('forbidden')
}
