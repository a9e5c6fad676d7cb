import { api } from '@/shared/api'
import { CODE_SYLLABLES } from '@/shared/api/lessons'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import { createId } from '@/db/create-id'
import { errorOf } from '@/tests/support/test-browser'
import { insertOpenLesson } from '@/tests/support/test-lessons'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let courseId: string
const db = () => server.database.db

async function begin(): Promise<void> {
  // A proxy is believed here, so that a test can come from many addresses.
  server = await startTestServer({ TRUST_PROXY: '1' })
  teacher = await insertPerson(db(), 'Ilse Marrow')
  courseId = await insertCourseWith(db(), 'Counterpoint', { [teacher.id]: 'teacher' })
}

const open = () => insertOpenLesson(db(), courseId, teacher.id)

/** Codes that no lesson has, in a fixed order. */
function* wrongCodes(taken: string): Generator<string> {
  for (let number = 0; ; number += 1) {
    const digits = number.toString(7).padStart(6, '0').split('')
    const code = digits.map((digit) => CODE_SYLLABLES[Number(digit)]).join('-')
    if (code !== taken) yield code
  }
}

const from = (address: string) => ({ 'x-forwarded-for': address })

describe('joining by code', () => {
  beforeAll(begin)
  afterAll(() => server.close())

  it('makes a guest of a phone, and brings the same phone back as the same guest', async () => {
    const { id, code } = await open()
    const phone = server.browser()
    expect(await phone.get(api.lessons.peek, { params: { code } })).toEqual({
      title: 'A lesson',
      needsName: true,
    })
    const first = await phone.get(api.lessons.join, { body: { code, name: 'José' } })
    expect(first).toMatchObject({ lessonId: id, name: 'José' })
    const again = await phone.get(api.lessons.join, { body: { code, name: 'José' } })
    expect(again.memberId).toBe(first.memberId)
    const { me } = await phone.get(api.people.me)
    expect(me).toMatchObject({ name: 'José', isGuest: true, email: null })
    expect(await phone.get(api.lessons.enter, { params: { lessonId: id } })).toMatchObject({
      role: 'guest',
      memberId: first.memberId,
    })
  })

  it('makes another guest when the phone is handed on under another name', async () => {
    const { code } = await open()
    const phone = server.browser()
    const first = await phone.get(api.lessons.join, { body: { code, name: 'Ana' } })
    const second = await phone.get(api.lessons.join, { body: { code, name: 'Bo' } })
    expect(second.memberId).not.toBe(first.memberId)
  })

  it('lets a student of the course in as themselves, without a name', async () => {
    const { code } = await open()
    const student = await insertPerson(db(), 'Zoë')
    await db().insertInto('courseMember').values({ courseId, userId: student.id, role: 'student' }).execute()
    const browser = await signedIn(server, student)
    expect(await browser.get(api.lessons.peek, { params: { code } })).toMatchObject({ needsName: false })
    expect(await browser.get(api.lessons.join, { body: { code } })).toMatchObject({ name: 'Zoë' })
  })

  it('lets an account from outside the course in as a guest, and nowhere else', async () => {
    const { id, code } = await open()
    const browser = await signedIn(server, await insertPerson(db(), 'Visitor'))
    await browser.get(api.lessons.join, { body: { code, name: 'Visitor' } })
    expect(await browser.get(api.lessons.enter, { params: { lessonId: id } })).toMatchObject({
      role: 'guest',
    })
    expect((await browser.ask(api.courses.get, { params: { courseId } })).status).toBe(404)
  })

  it('binds a guest to one lesson: joining another leaves the first', async () => {
    const one = await open()
    const two = await open()
    const phone = server.browser()
    await phone.get(api.lessons.join, { body: { code: one.code, name: 'Ana' } })
    await phone.get(api.lessons.join, { body: { code: two.code, name: 'Ana' } })
    expect((await phone.ask(api.lessons.get, { params: { lessonId: two.id } })).status).toBe(200)
    expect((await phone.ask(api.lessons.get, { params: { lessonId: one.id } })).status).toBe(404)
  })

  it('keeps what a guest wrote when they sign in', async () => {
    const { id, code } = await open()
    const person = await insertPerson(db(), 'Ana')
    const phone = server.browser()
    const { memberId } = await phone.get(api.lessons.join, { body: { code, name: 'Ana' } })
    await phone.signIn(person.email, 'four plain words here')
    expect(await phone.get(api.lessons.enter, { params: { lessonId: id } })).toMatchObject({ memberId })
  })

  it('answers alike for codes that are unknown, closed, ended or no codes at all', async () => {
    const closed = await open()
    await db().updateTable('lesson').set({ isDoorOpen: false }).where('id', '=', closed.id).execute()
    const ended = await open()
    await (await signedIn(server, teacher)).get(api.lessons.end, { params: { lessonId: ended.id } })
    const unknown = wrongCodes(closed.code).next().value as string
    const answers = await Promise.all(
      [unknown, closed.code, ended.code, 'no-code'].map((code) =>
        server.browser().ask(api.lessons.peek, { params: { code } }),
      ),
    )
    for (const answer of answers) {
      expect([answer.status, answer.text]).toEqual([404, JSON.stringify({ error: { code: 'code-unknown' } })])
    }
  })

  it.each([
    ['no name', undefined, 422, 'empty'],
    ['an empty one', '   ', 422, 'empty'],
    ['one too long', 'x'.repeat(61), 422, 'too-long'],
    ['control characters', 'An\u0000a', 422, 'hidden-characters'],
    ['characters that turn the writing', '\u202eanA', 422, 'hidden-characters'],
    ['characters that show nothing', 'An\u200ba', 422, 'hidden-characters'],
    ['nothing one could say', '… !', 422, 'no-letters'],
    ['a heap of accents', `A${'\u0301'.repeat(30)}`, 422, 'too-many-marks'],
    ['the name of the teacher', 'ILSE  MÁRROW', 422, 'taken'],
  ])('refuses a name that is %s', async (_what, name, status, problem) => {
    const { id, code } = await open()
    await (await signedIn(server, teacher)).get(api.lessons.enter, { params: { lessonId: id } })
    const answer = await server.browser().ask(api.lessons.join, { body: { code, name } })
    expect(answer.status).toBe(status)
    expect(errorOf(answer).fields?.[0]).toMatchObject({ path: 'name', code: problem })
  })

  it.each([
    '<b>Ana</b>',
    'Ana"; drop table "user"; --',
    'نور',
    'Þór',
    '佐伯 澪',
    'نیم\u200cفاصله',
    '👩🏽‍🎤 Ana',
    'José',
  ])('takes %s as it stands', async (name) => {
    const { code } = await open()
    const joined = await server.browser().get(api.lessons.join, { body: { code, name } })
    expect(joined.name).toBe(name)
  })

  it('says that a lesson is full', async () => {
    const { id, code } = await open()
    await db()
      .insertInto('lessonMember')
      .values(
        Array.from({ length: WIRE_LIMITS.membersALesson }, () => ({
          id: createId(),
          lessonId: id,
          userId: null,
          name: 'Somebody',
          role: 'guest' as const,
        })),
      )
      .execute()
    const answer = await server.browser().ask(api.lessons.join, { body: { code, name: 'Ana' } })
    expect(errorOf(answer).code).toBe('lesson-full')
  })

  it('never lets more in than a lesson holds, however many come at once', async () => {
    const { id, code } = await open()
    await db()
      .insertInto('lessonMember')
      .values(
        Array.from({ length: WIRE_LIMITS.membersALesson - 3 }, () => ({
          id: createId(),
          lessonId: id,
          userId: null,
          name: 'Somebody',
          role: 'guest' as const,
        })),
      )
      .execute()
    const answers = await Promise.all(
      Array.from({ length: 10 }, (_, index) =>
        server.browser().ask(api.lessons.join, { body: { code, name: `Guest ${index}` } }),
      ),
    )
    expect(answers.filter(({ status }) => status === 200)).toHaveLength(3)
  })

  it('keeps out whom the teacher sent away', async () => {
    const { id, code } = await open()
    const phone = server.browser()
    const { memberId } = await phone.get(api.lessons.join, { body: { code, name: 'Ana' } })
    await db().updateTable('lessonMember').set({ isRemoved: true }).where('id', '=', memberId).execute()
    expect((await phone.ask(api.lessons.enter, { params: { lessonId: id } })).status).toBe(403)
    expect((await phone.ask(api.lessons.join, { body: { code, name: 'Ana' } })).status).toBe(403)
  })
})

describe('guessing codes', () => {
  beforeEach(begin)
  afterEach(() => server.close())

  it('ends after thirty wrong ones from one source, in a burst too, and then even the right one is refused', async () => {
    const { code } = await open()
    const codes = wrongCodes(code)
    const guesses = await Promise.all(
      Array.from({ length: 45 }, () =>
        server
          .browser()
          .request('GET', `/api/join/${codes.next().value as string}`, { headers: from('10.1.1.1') }),
      ),
    )
    expect(guesses.filter(({ status }) => status === 404)).toHaveLength(30)
    expect(guesses.filter(({ status }) => status === 429)).toHaveLength(15)
    const right = await server.browser().request('GET', `/api/join/${code}`, { headers: from('10.1.1.1') })
    expect(right.status).toBe(429)
    expect(errorOf(right).retryAfterSeconds).toBeGreaterThan(60)
    const elsewhere = await server
      .browser()
      .request('GET', `/api/join/${code}`, { headers: from('10.1.1.2') })
    expect(elsewhere.status).toBe(200)
  })

  it('does not count right codes: a class behind one address gets in', async () => {
    const { code } = await open()
    const answers = await Promise.all(
      Array.from({ length: 60 }, (_, index) =>
        server.browser().ask(api.lessons.join, { body: { code, name: `Pupil ${index}` } }),
      ),
    )
    expect(answers.map(({ status }) => status)).toEqual(Array(60).fill(200))
  })

  it('from many sources at once leaves each of them fewer tries, and shuts nobody out who has the code', async () => {
    const { code } = await open()
    const codes = wrongCodes(code)
    const guess = async (address: string) =>
      (
        await server
          .browser()
          .request('GET', `/api/join/${codes.next().value as string}`, { headers: from(address) })
      ).status
    for (let source = 0; source < 30; source += 1) {
      await Promise.all(Array.from({ length: 20 }, () => guess(`10.2.0.${source}`)))
    }
    const late: number[] = []
    for (let times = 0; times < 7; times += 1) late.push(await guess('10.3.0.1'))
    expect(late).toEqual([404, 404, 404, 404, 404, 429, 429])
    const right = await server.browser().request('GET', `/api/join/${code}`, { headers: from('10.4.0.1') })
    expect(right.status).toBe(200)
  })

  it('does not believe an address that no configured proxy vouches for', async () => {
    const plain = await startTestServer()
    try {
      const codes = wrongCodes('')
      const statuses: number[] = []
      for (let times = 0; times < 32; times += 1) {
        const path = `/api/join/${codes.next().value as string}`
        statuses.push(
          (await plain.browser().request('GET', path, { headers: from(`10.9.0.${times}`) })).status,
        )
      }
      expect(statuses.slice(30)).toEqual([429, 429])
    } finally {
      await plain.close()
    }
  })
})
