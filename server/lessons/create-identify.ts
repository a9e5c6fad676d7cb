import type { Connection } from '@/db/connect'
import type { IdentifyConnection } from '@/realtime/contract'
import { findAsker, type Asker } from '@/server/auth/asker'
import type { Auth } from '@/server/auth/create-auth'
import { idSchema } from '@/shared/api/fields'
import { enterLesson } from './enter-lesson'
import { findStanding, type Standing } from './find-standing'

const sessionOf = ({ person, wall }: Asker, { role }: Standing) =>
  (role === 'wall' ? wall?.id : person?.sessionId) ?? ''

/** Tells the live rooms whom a connection speaks for, by the same rules as the routes. */
export const createIdentify =
  ({ auth, db }: Readonly<{ auth: Auth; db: Connection }>): IdentifyConnection =>
  async (request, lessonId) => {
    if (!idSchema.safeParse(lessonId).success) return { ok: false, refusal: 'not-found' }
    const asker = await findAsker({ auth, db }, request.headers)
    if (!asker.person && !asker.wall) return { ok: false, refusal: 'signed-out' }
    const standing = await findStanding(db, lessonId, asker)
    if (!standing) return { ok: false, refusal: 'not-found' }
    const entered = await enterLesson(db, standing, asker.person)
    if (!entered.ok) {
      return { ok: false, refusal: entered.reason === 'door-closed' ? 'forbidden' : entered.reason }
    }
    const sessionId = sessionOf(asker, standing)
    return { ok: true, identity: { lessonId, ...entered.value, sessionId } }
  }
