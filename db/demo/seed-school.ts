import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import { findUserByEmail } from '@/db/queries/people'
import { DEMO_PEOPLE, type DemoPerson } from './people'

export const DEMO_COURSE_ID = 'demo-counterpoint-1b'
const DEMO_COURSE = 'Counterpoint I, section B'
/** The sign-in library's name for an account with a password. */
const PASSWORD_PROVIDER = 'credential'

async function insertPerson(db: Connection, person: DemoPerson, password: string | null): Promise<string> {
  const id = createId()
  await db.transaction().execute(async (trx) => {
    await trx
      .insertInto('user')
      .values({
        id,
        name: person.name,
        email: person.email,
        emailVerified: true,
        isAnonymous: false,
        isAdministrator: person.role === 'administrator',
        mayMakeCourses: person.role === 'teacher',
      })
      .execute()
    await trx
      .insertInto('account')
      .values({
        id: createId(),
        userId: id,
        accountId: id,
        providerId: PASSWORD_PROVIDER,
        password,
        updatedAt: new Date(),
      })
      .execute()
  })
  return id
}

/**
 * Puts the invented school in: its people, its course, who is what in it. Run at every start; what is there is left as
 * people made it. Gives the teacher's user id.
 */
export async function seedSchool(db: Connection, passwordHash: () => Promise<string>): Promise<string> {
  let hash: string | null = null
  const ids = new Map<DemoPerson, string>()
  for (const person of DEMO_PEOPLE) {
    const known = await findUserByEmail(db, person.email)
    // Hashing is slow on purpose: one hash serves all, and none is made when everybody is there.
    if (!known) hash ??= await passwordHash()
    ids.set(person, known?.id ?? (await insertPerson(db, person, hash)))
  }
  const { numInsertedOrUpdatedRows } = await db
    .insertInto('course')
    .values({ id: DEMO_COURSE_ID, name: DEMO_COURSE })
    .onConflict((conflict) => conflict.column('id').doNothing())
    .executeTakeFirst()
  const isNew = numInsertedOrUpdatedRows === 1n
  for (const [person, userId] of ids) {
    if (!isNew || person.role === 'administrator') continue
    await db
      .insertInto('courseMember')
      .values({ courseId: DEMO_COURSE_ID, userId, role: person.role })
      .execute()
  }
  const teacher = DEMO_PEOPLE.find(({ role }) => role === 'teacher')
  const teacherId = teacher && ids.get(teacher)
  if (!teacherId) throw new Error('The demo has no teacher')
  return teacherId
}
