import type { Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import { countAdministrators, findUserByEmail } from '@/db/queries/people'
import type { Auth } from '@/server/auth/create-auth'

/**
 * Makes the first administrator: no request can. The address is sent the ordinary message that lets its owner choose a
 * password; nobody is told one. Says whether there was none before.
 */
export async function ensureAdministrator(db: Connection, auth: Auth, email: string): Promise<boolean> {
  if ((await countAdministrators(db)) > 0) return false
  const known = await findUserByEmail(db, email)
  const roles = { isAdministrator: true, mayMakeCourses: true, emailVerified: true }
  if (known) {
    await db.updateTable('user').set(roles).where('id', '=', known.id).execute()
  } else {
    await db
      .insertInto('user')
      .values({ id: createId(), name: 'Administrator', email: email.toLowerCase(), ...roles })
      .execute()
  }
  await auth.api.requestPasswordReset({ body: { email: email.toLowerCase() } })
  return true
}
