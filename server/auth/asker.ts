import type { IncomingHttpHeaders } from 'node:http'
import type { Response } from 'express'
import { APIError } from 'better-auth/api'
import { fromNodeHeaders } from 'better-auth/node'
import type { Connection } from '@/db/connect'
import { findWallSession } from '@/db/queries/wall-sessions'
import { Refused } from '@/server/errors/refused'
import type { Auth } from './create-auth'
import { readWallCookie } from './wall-cookie'
import { hashToken } from './token'

/** Somebody signed in. A guest is one too, with `isGuest`; it has no address and belongs to the lessons it joined. */
export type Person = Readonly<{
  id: string
  name: string
  email: string
  isVerified: boolean
  isGuest: boolean
  isAdministrator: boolean
  mayMakeCourses: boolean
  sessionId: string
}>

/** A screen with a wall's cookie. */
export type Wall = Readonly<{ id: string; lessonId: string }>

/** Who a request speaks for. Both may be there at once: a teacher whose own machine is the wall. */
export type Asker = Readonly<{ person: Person | null; wall: Wall | null }>

type Findings = Readonly<{
  auth: Auth
  db: Connection
}>

/** The library hides why it could not look a login up; there is nothing in the way of that but the database. */
function refuseUnavailable(error: unknown): never {
  throw error instanceof APIError && error.statusCode === 500
    ? new Refused('unavailable', { cause: error })
    : error
}

/**
 * Reads who asks from the cookies, in the database and not in a cached cookie: a login that was ended a moment ago is
 * nobody's. Where there is a `response`, a login that is used is made to last.
 */
export async function findAsker(
  { auth, db }: Findings,
  headers: IncomingHttpHeaders,
  response?: Response,
): Promise<Asker> {
  if (!headers.cookie) return { person: null, wall: null }
  const wallCookie = readWallCookie(headers.cookie)
  const [{ headers: answered, response: login }, wall] = await Promise.all([
    auth.api
      .getSession({
        headers: fromNodeHeaders({ cookie: headers.cookie }),
        query: { disableCookieCache: true, disableRefresh: response === undefined },
        returnHeaders: true,
      })
      .catch(refuseUnavailable),
    wallCookie ? findWallSession(db, hashToken(wallCookie)) : undefined,
  ])
  if (login && response) for (const cookie of answered.getSetCookie()) response.append('Set-Cookie', cookie)
  const person = login && {
    id: login.user.id,
    name: login.user.name,
    email: login.user.email,
    isVerified: login.user.emailVerified,
    isGuest: login.user.isAnonymous === true,
    isAdministrator: login.user.isAdministrator === true,
    mayMakeCourses: login.user.mayMakeCourses === true,
    sessionId: login.session.id,
  }
  return { person, wall: wall ? { id: wall.id, lessonId: wall.lessonId } : null }
}

/** The person who asks, guests included. */
export function personOf({ person }: Asker): Person {
  if (!person) throw new Refused('signed-out')
  return person
}

/** The account that asks. A guest has none. */
export function accountOf(asker: Asker): Person {
  const person = personOf(asker)
  if (person.isGuest) throw new Refused('forbidden')
  return person
}
