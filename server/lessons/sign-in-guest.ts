import type { Response } from 'express'
import type { Person } from '@/server/auth/asker'
import type { Context } from '@/server/routes/context'

/**
 * Makes a guest and signs the phone in as it. A guest belongs to one lesson: the login it had for another one ends. Gives
 * the new guest's user id.
 */
export async function signInGuest(
  { auth, db }: Context,
  { response }: Readonly<{ response: Response }>,
  { name, old }: Readonly<{ name: string; old: Person | null }>,
): Promise<string> {
  const { headers, response: login } = await auth.api.signInAnonymous({
    headers: new Headers(),
    returnHeaders: true,
  })
  await db.updateTable('user').set({ name }).where('id', '=', login.user.id).execute()
  if (old?.isGuest) {
    const internal = (await auth.$context).internalAdapter
    await internal.deleteUserSessions(old.id)
  }
  response.removeHeader('Set-Cookie')
  for (const cookie of headers.getSetCookie()) response.append('Set-Cookie', cookie)
  return login.user.id
}
