import { hashPassword } from 'better-auth/crypto'
import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import type { CourseRole } from '@/shared/api/fields'
import type { TestBrowser } from './test-browser'
import type { TestServer } from './test-server'

export const PASSWORD = 'four plain words here'

let hash: Promise<string> | null = null

export type TestPerson = Readonly<{ id: string; name: string; email: string }>

/** An account with a confirmed address, unless said otherwise. */
export async function insertPerson(
  db: Connection,
  name: string,
  more: Readonly<{
    email?: string
    isAdministrator?: boolean
    mayMakeCourses?: boolean
    emailVerified?: boolean
  }> = {},
): Promise<TestPerson> {
  hash ??= hashPassword(PASSWORD)
  const id = createId()
  const email = more.email ?? `${id.toLowerCase().replace(/[^a-z0-9]/g, 'x')}@school.example`
  await db
    .insertInto('user')
    .values({ id, name, emailVerified: true, isAnonymous: false, ...more, email })
    .execute()
  await db
    .insertInto('account')
    .values({
      id: createId(),
      userId: id,
      accountId: id,
      providerId: 'credential',
      password: await hash,
      updatedAt: new Date(),
    })
    .execute()
  return { id, name, email }
}

/** A browser in which the person has signed in. */
export async function signedIn(server: TestServer, person: TestPerson): Promise<TestBrowser> {
  const browser = server.browser()
  const { status, text } = await browser.signIn(person.email, PASSWORD)
  if (status !== 200) throw new Error(`Signing in failed: ${status} ${text}`)
  return browser
}

/** A course with somebody in each role. */
export async function insertCourseWith(
  db: Connection,
  name: string,
  members: Readonly<Record<string, CourseRole>>,
): Promise<string> {
  const id = createId()
  await db.insertInto('course').values({ id, name }).execute()
  for (const [userId, role] of Object.entries(members)) {
    await db.insertInto('courseMember').values({ courseId: id, userId, role }).execute()
  }
  return id
}
