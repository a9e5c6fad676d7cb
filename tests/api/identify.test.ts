import type { IncomingMessage } from 'node:http'
import { createIdentify } from '@/server/lessons/create-identify'
import { api } from '@/shared/api'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import type { TestBrowser } from '@/tests/support/test-browser'
import { insertOpenLesson, insertPreparedLesson } from '@/tests/support/test-lessons'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let leader: TestBrowser
let courseId: string
const db = () => server.database.db

beforeAll(async () => {
  server = await startTestServer()
  teacher = await insertPerson(db(), 'Ilse Marrow')
  leader = await signedIn(server, teacher)
  courseId = await insertCourseWith(db(), 'Counterpoint', { [teacher.id]: 'teacher' })
})
afterAll(() => server.close())

/** What a connection upgrade with this browser's cookies is told. */
const identify = (browser: TestBrowser, lessonId: string) => {
  const cookie = [...browser.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
  const request = { headers: { ...(cookie && { cookie }) } } as IncomingMessage
  return createIdentify({ auth: server.server.auth, db: db() })(request, lessonId)
}

const pupil = async (role: 'student' | 'assistant' = 'student') => {
  const person = await insertPerson(db(), 'Zoë')
  await db().insertInto('courseMember').values({ courseId, userId: person.id, role }).execute()
  return { person, browser: await signedIn(server, person) }
}

describe('a live connection', () => {
  it('speaks for whom its cookie says, and is a member like by the route', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const { browser } = await pupil()
    const entered = await browser.get(api.lessons.enter, { params: { lessonId: id } })
    expect(await identify(browser, id)).toMatchObject({
      ok: true,
      identity: { lessonId: id, role: 'student', memberId: entered.memberId, name: 'Zoë' },
    })
    expect(await identify(leader, id)).toMatchObject({ ok: true, identity: { role: 'teacher' } })
    const helper = await pupil('assistant')
    expect(await identify(helper.browser, id)).toMatchObject({ ok: true, identity: { role: 'assistant' } })
  })

  it('of a wall is nobody and may show', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const { url } = await leader.get(api.lessons.createWallLink, { params: { lessonId: id } })
    const screen = server.browser()
    await screen.get(api.lessons.openWall, { body: { token: url.split('/').at(-1) } })
    expect(await identify(screen, id)).toMatchObject({ ok: true, identity: { role: 'wall', memberId: null } })
    const other = await insertOpenLesson(db(), courseId, teacher.id)
    expect(await identify(screen, other.id)).toEqual({ ok: false, refusal: 'not-found' })
  })

  it('of a guest is bound to the guest’s lesson', async () => {
    const { id, code } = await insertOpenLesson(db(), courseId, teacher.id)
    const phone = server.browser()
    const { memberId } = await phone.get(api.lessons.join, { body: { code, name: 'Ana' } })
    expect(await identify(phone, id)).toMatchObject({
      ok: true,
      identity: { role: 'guest', memberId, name: 'Ana' },
    })
    const other = await insertOpenLesson(db(), courseId, teacher.id)
    expect(await identify(phone, other.id)).toEqual({ ok: false, refusal: 'not-found' })
  })

  it.each(['signed-out', 'not-found', 'lesson-ended', 'removed', 'lesson-full', 'forbidden'] as const)(
    'is refused as %s where it has to be',
    async (refusal) => {
      const { id } = await insertOpenLesson(db(), courseId, teacher.id)
      const { browser } = await pupil()
      const asked = {
        'signed-out': () => identify(server.browser(), id),
        'not-found': async () => identify(await signedIn(server, await insertPerson(db(), 'Stranger')), id),
        'lesson-ended': async () => {
          await leader.get(api.lessons.end, { params: { lessonId: id } })
          return identify(browser, id)
        },
        removed: async () => {
          const { memberId } = await browser.get(api.lessons.enter, { params: { lessonId: id } })
          await db().updateTable('lessonMember').set({ isRemoved: true }).where('id', '=', memberId).execute()
          return identify(browser, id)
        },
        'lesson-full': async () => {
          const many = Array.from({ length: WIRE_LIMITS.membersALesson }, (_, index) => ({
            id: `filler-${index}-${id}`.slice(0, 64),
            lessonId: id,
            userId: null,
            name: 'Somebody',
            role: 'guest' as const,
          }))
          await db().insertInto('lessonMember').values(many).execute()
          return identify(browser, id)
        },
        forbidden: async () =>
          identify(await signedIn(server, await insertPerson(db(), 'Admin', { isAdministrator: true })), id),
      }[refusal]
      expect(await asked()).toEqual({ ok: false, refusal })
    },
  )

  it('ends with the login: a cookie of a login that was ended is nobody’s at once', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const { browser } = await pupil()
    const kept = new Map(browser.cookies)
    await browser.auth('/sign-out', {})
    for (const [name, value] of kept) browser.cookies.set(name, value)
    expect(await identify(browser, id)).toEqual({ ok: false, refusal: 'signed-out' })
  })

  it('to a lesson in preparation is the teacher’s', async () => {
    const id = await insertPreparedLesson(db(), courseId, teacher.id)
    const { browser } = await pupil()
    expect(await identify(browser, id)).toEqual({ ok: false, refusal: 'not-found' })
    expect(await identify(leader, id)).toMatchObject({ ok: true })
  })

  it.each(['', 'x', '../board', 'a'.repeat(100)])('to %p is refused', async (lessonId) => {
    expect(await identify(leader, lessonId)).toEqual({ ok: false, refusal: 'not-found' })
  })
})
