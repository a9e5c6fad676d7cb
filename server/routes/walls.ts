import { findWallSession, insertWallSession } from '@/db/queries/wall-sessions'
import { personOf } from '@/server/auth/asker'
import { createToken, hashToken } from '@/server/auth/token'
import { readWallCookie, WALL_COOKIE, WALL_COOKIE_MS, wallCookieOptions } from '@/server/auth/wall-cookie'
import { Refused } from '@/server/errors/refused'
import { originFor } from '@/server/http/client-source'
import { createRouter } from '@/server/http/create-router'
import { standingToAct } from '@/server/lessons/access'
import { createLinkId, readWallLink, signWallLink, WALL_LINK_MS } from '@/server/lessons/wall-link'
import { findLesson } from '@/db/queries/lessons'
import { lessons } from '@/shared/api/lessons'
import { askerOf, type Context } from './context'

export function createWallRoutes(context: Context) {
  const { router, on } = createRouter()
  const { db, config, secret } = context

  on(lessons.createWallLink, async (asked) => {
    const asker = await askerOf(context, asked)
    const { lesson } = await standingToAct(context, asker, asked.params.lessonId, 'link wall')
    const expiresAt = new Date(Date.now() + WALL_LINK_MS)
    const claim = { lessonId: lesson.id, linkId: createLinkId(), madeBy: personOf(asker).id, expiresAt }
    return {
      url: `${originFor(asked.request, config)}/wall/${signWallLink(claim, secret)}`,
      expiresAt: expiresAt.toISOString(),
    }
  })

  on(lessons.openWall, async (asked) => {
    const link = readWallLink(asked.body.token, secret, new Date())
    if (!link.ok) throw new Refused(link.reason === 'ended' ? 'ended' : 'not-found')
    const { lessonId, linkId, madeBy } = link.value
    if (!(await findLesson(db, lessonId))) throw new Refused('not-found')
    const token = createToken()
    const expiresAt = new Date(Date.now() + WALL_COOKIE_MS)
    const wall = { lessonId, linkId, openedBy: madeBy, tokenHash: hashToken(token), expiresAt }
    if (!(await insertWallSession(db, wall))) {
      // Spent; but the screen that spent it may load its page once more.
      const cookie = readWallCookie(asked.request.headers.cookie ?? '')
      const own = cookie ? await findWallSession(db, hashToken(cookie)) : undefined
      if (own?.linkId === linkId) return { lessonId }
      throw new Refused('ended')
    }
    asked.response.cookie(WALL_COOKIE, token, wallCookieOptions(config.publicUrl))
    return { lessonId }
  })

  return router
}
