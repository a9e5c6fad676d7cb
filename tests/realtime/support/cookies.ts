import { findLesson } from '@/db/queries/lessons'
import type { Connection } from '@/db/connect'
import type { IdentifyConnection } from '@/realtime/contract'

/** What a test client says it is. Signing in is another test's matter; membership is looked up as the server does. */
export type TestCookie = Readonly<{ sessionId: string; memberId?: string; wallOf?: string }>

export const formatCookie = (cookie: TestCookie): string =>
  `test=${Buffer.from(JSON.stringify(cookie)).toString('base64url')}`

function parseCookie(header: string | undefined): TestCookie | null {
  const match = /^test=([\w-]+)$/.exec(header ?? '')
  return match ? (JSON.parse(Buffer.from(match[1] as string, 'base64url').toString()) as TestCookie) : null
}

/** Identifies by a cookie that tests write, against the members in the database. */
export const createIdentify =
  (db: Connection, endedSessions: ReadonlySet<string> = new Set()): IdentifyConnection =>
  async (request, lessonId) => {
    const cookie = parseCookie(request.headers.cookie)
    if (!cookie || endedSessions.has(cookie.sessionId)) return { ok: false, refusal: 'signed-out' }
    const { sessionId } = cookie
    const lesson = await findLesson(db, lessonId)
    if (!lesson) return { ok: false, refusal: 'not-found' }
    if (cookie.wallOf !== undefined) {
      if (cookie.wallOf !== lessonId) return { ok: false, refusal: 'forbidden' }
      return { ok: true, identity: { lessonId, memberId: null, role: 'wall', name: '', sessionId } }
    }
    const member = await db
      .selectFrom('lessonMember')
      .selectAll()
      .where('id', '=', cookie.memberId ?? '')
      .where('lessonId', '=', lessonId)
      .executeTakeFirst()
    if (!member) return { ok: false, refusal: 'forbidden' }
    if (member.isRemoved) return { ok: false, refusal: 'removed' }
    const { id: memberId, role, name } = member
    const leads = role === 'teacher' || role === 'assistant'
    if (lesson.status === 'ended' && !leads) return { ok: false, refusal: 'lesson-ended' }
    return { ok: true, identity: { lessonId, memberId, role, name, sessionId } }
  }
