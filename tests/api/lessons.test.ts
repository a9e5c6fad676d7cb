import { api } from '@/shared/api'
import { lessonCodeSchema } from '@/shared/api/lessons'
import { openWithFreshCode } from '@/server/lessons/open-lesson'
import { signWallLink } from '@/server/lessons/wall-link'
import { errorOf, type TestBrowser } from '@/tests/support/test-browser'
import { testExercise, testStage } from '@/tests/support/test-exercise'
import { insertOpenLesson, insertPreparedLesson } from '@/tests/support/test-lessons'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, TEST_SECRET, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let pupil: TestPerson
let leader: TestBrowser
let student: TestBrowser
let courseId: string
const db = () => server.database.db

beforeAll(async () => {
  server = await startTestServer()
  teacher = await insertPerson(db(), 'Ilse Marrow')
  pupil = await insertPerson(db(), 'Zoë Ashdown')
  leader = await signedIn(server, teacher)
  student = await signedIn(server, pupil)
  courseId = await insertCourseWith(db(), 'Counterpoint', { [teacher.id]: 'teacher', [pupil.id]: 'student' })
})
afterAll(() => server.close())

const create = (change: object = {}, body: object = {}) =>
  leader.ask(api.lessons.create, {
    params: { courseId },
    body: { title: 'The cadence', exercise: { ...testExercise(), ...change }, stage: testStage(), ...body },
  })

describe('a lesson', () => {
  it('is prepared, opened under a code, ended, and opened again under another', async () => {
    const made = await leader.get(api.lessons.create, {
      params: { courseId },
      body: { title: 'The cadence', exercise: testExercise(), stage: testStage() },
    })
    const params = { lessonId: made.lesson.id }
    expect(made.lesson).toMatchObject({ status: 'prepared', code: null, openedAt: null, endedAt: null })
    const opened = (await leader.get(api.lessons.open, { params })).lesson
    expect(opened.status).toBe('open')
    expect(lessonCodeSchema.safeParse(opened.code).success).toBe(true)
    const twice = (await leader.get(api.lessons.open, { params })).lesson
    expect(twice.code).toBe(opened.code)
    const ended = (await leader.get(api.lessons.end, { params })).lesson
    expect(ended).toMatchObject({ status: 'ended', code: null })
    expect((await leader.ask(api.lessons.end, { params })).status).toBe(200)
    const again = (await leader.get(api.lessons.open, { params })).lesson
    expect(again).toMatchObject({ status: 'open', endedAt: null })
    expect(again.code).not.toBe(opened.code)
  })

  it('draws another code where one is taken', async () => {
    const { code } = await insertOpenLesson(db(), courseId, teacher.id)
    const id = await insertPreparedLesson(db(), courseId, teacher.id)
    const draws = [code, code, 'ti-ti-ti-ti-ti-do']
    await openWithFreshCode(db(), id, () => draws.shift() ?? '')
    const { lesson } = await leader.get(api.lessons.get, { params: { lessonId: id } })
    expect(lesson.code).toBe('ti-ti-ti-ti-ti-do')
  })

  it('cannot be ended before it was opened, nor its door moved when it is over', async () => {
    const prepared = { lessonId: await insertPreparedLesson(db(), courseId, teacher.id) }
    expect((await leader.ask(api.lessons.end, { params: prepared })).status).toBe(409)
    expect(
      (await leader.ask(api.lessons.update, { params: prepared, body: { isDoorOpen: false } })).status,
    ).toBe(409)
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    await leader.get(api.lessons.end, { params: { lessonId: id } })
    const door = await leader.ask(api.lessons.update, {
      params: { lessonId: id },
      body: { isDoorOpen: true },
    })
    expect(errorOf(door).code).toBe('ended')
  })

  it('closes its door to newcomers and keeps who is in', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const params = { lessonId: id }
    const late = await insertPerson(db(), 'Late')
    await db().insertInto('courseMember').values({ courseId, userId: late.id, role: 'student' }).execute()
    const first = await student.get(api.lessons.enter, { params })
    await leader.get(api.lessons.update, { params, body: { isDoorOpen: false } })
    expect((await student.get(api.lessons.enter, { params })).memberId).toBe(first.memberId)
    const refused = await (await signedIn(server, late)).ask(api.lessons.enter, { params })
    expect(errorOf(refused).code).toBe('door-closed')
    expect((await leader.get(api.lessons.enter, { params })).role).toBe('teacher')
  })

  it('is entered once, however often and from how many devices at once', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const params = { lessonId: id }
    const phone = await signedIn(server, pupil)
    const entries = await Promise.all(
      [student, phone, student, phone].map((device) => device.get(api.lessons.enter, { params })),
    )
    expect(new Set(entries.map(({ memberId }) => memberId)).size).toBe(1)
    await leader.get(api.lessons.enter, { params })
    const { members } = await leader.get(api.lessons.roster, { params })
    expect(members.map(({ name, role }) => `${name}, ${role}`)).toEqual([
      'Zoë Ashdown, student',
      'Ilse Marrow, teacher',
    ])
  })

  it('follows a change of role in the course, and a leaving of it', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const params = { lessonId: id }
    const person = await insertPerson(db(), 'Climber')
    await db().insertInto('courseMember').values({ courseId, userId: person.id, role: 'student' }).execute()
    const browser = await signedIn(server, person)
    const { memberId } = await browser.get(api.lessons.enter, { params })
    const member = { courseId, userId: person.id }
    await leader.get(api.courses.updateMember, { params: member, body: { role: 'assistant' } })
    expect(await browser.get(api.lessons.enter, { params })).toMatchObject({ role: 'assistant', memberId })
    await leader.get(api.courses.removeMember, { params: member })
    expect((await browser.ask(api.lessons.enter, { params })).status).toBe(404)
  })

  it('that has ended is told as ended to students, and still there for its teacher', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const params = { lessonId: id }
    await student.get(api.lessons.enter, { params })
    await leader.get(api.lessons.end, { params })
    expect(errorOf(await student.ask(api.lessons.enter, { params })).code).toBe('ended')
    expect((await leader.get(api.lessons.enter, { params })).lesson.status).toBe('ended')
  })

  it('is removed with all that belongs to it', async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const params = { lessonId: id }
    await student.get(api.lessons.enter, { params })
    await leader.get(api.lessons.remove, { params })
    expect((await leader.ask(api.lessons.get, { params })).status).toBe(404)
    const left = await db().selectFrom('lessonMember').select('id').where('lessonId', '=', id).execute()
    expect(left).toEqual([])
  })

  it('is neither prepared nor opened in a course that was put away', async () => {
    const old = await insertCourseWith(db(), 'Old', { [teacher.id]: 'teacher' })
    const lessonId = await insertPreparedLesson(db(), old, teacher.id)
    await leader.get(api.courses.update, { params: { courseId: old }, body: { isArchived: true } })
    expect((await leader.ask(api.lessons.open, { params: { lessonId } })).status).toBe(409)
    const another = await leader.ask(api.lessons.create, {
      params: { courseId: old },
      body: { title: 'New', exercise: testExercise(), stage: testStage() },
    })
    expect(another.status).toBe(409)
  })

  it.each([
    ['a cantus too short', { cantus: ['D4', 'D4'] }],
    ['a cantus too long', { cantus: Array(41).fill('D4') }],
    ['a wrong final', { final: 'G' }],
    ['a note its clef does not carry', { cantus: ['D4', 'D8', 'D4'] }],
    ['no notes', { cantus: ['x', 'y', 'z'] }],
    ['a species there is none of', { species: 6 }],
    ['a rule nobody knows', { ruleSet: { id: 'x', name: 'X', rules: { 'no-such-rule': { level: 'law' } } } }],
    ['a level that is none', { ruleSet: { id: 'x', name: 'X', rules: { 'cf-range': { level: 'maybe' } } } }],
    [
      'bad parameters',
      { ruleSet: { id: 'x', name: 'X', rules: { 'cf-range': { level: 'law', params: { most: 'far' } } } } },
    ],
    ['a signature of eight flats', { signature: -8 }],
    ['something beside', { extra: true }],
  ])('is refused with %s', async (_what, change) => {
    const answer = await create(change)
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.length).toBeGreaterThan(0)
  })

  it('is refused with a prompt too long and without a title', async () => {
    expect((await create({}, { stage: { ...testStage(), prompt: 'x'.repeat(281) } })).status).toBe(422)
    expect((await create({}, { title: '' })).status).toBe(422)
  })

  it.each([
    ['its prompt', {}, { stage: { ...testStage(), prompt: 'a\u0000b' } }],
    ['the name of its rule set', { ruleSet: { id: 'x', name: 'a\ud800b', rules: {} } }, {}],
    ['its exercise', { title: 'a\u0000b' }, {}],
  ])('is refused with what cannot be kept in %s', async (_what, change, body) => {
    const answer = await create(change, body)
    expect(errorOf(answer).fields?.[0]?.code).toBe('hidden-characters')
  })
})

describe('a wall', () => {
  const link = async () => {
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const { url, expiresAt } = await leader.get(api.lessons.createWallLink, { params: { lessonId: id } })
    return { id, url, expiresAt, token: url.split('/').at(-1) ?? '' }
  }

  it('is opened by a short-lived link and can do nothing but show', async () => {
    const { id, token, url, expiresAt } = await link()
    expect(url).toContain('/wall/')
    expect(new Date(expiresAt).getTime() - Date.now()).toBeLessThan(20 * 60 * 1000)
    const screen = server.browser()
    const answer = await screen.ask(api.lessons.openWall, { body: { token } })
    expect(answer.headers.getSetCookie()[0]).toMatch(/^bicinium\.wall=.*HttpOnly/i)
    expect(await screen.get(api.lessons.enter, { params: { lessonId: id } })).toMatchObject({
      role: 'wall',
      memberId: null,
    })
    expect((await screen.get(api.people.me)).me).toBeNull()
  })

  it('is opened by its link once; the same screen may load again', async () => {
    const { token } = await link()
    const screen = server.browser()
    await screen.get(api.lessons.openWall, { body: { token } })
    await screen.get(api.lessons.openWall, { body: { token } })
    expect((await server.browser().ask(api.lessons.openWall, { body: { token } })).status).toBe(410)
  })

  it('is not opened by a link that is over, forged, cut or bent to another lesson', async () => {
    const { id, token } = await link()
    const claim = { lessonId: id, linkId: 'link-of-this-test', madeBy: teacher.id }
    const over = signWallLink({ ...claim, expiresAt: new Date(Date.now() - 1000) }, TEST_SECRET)
    const later = new Date(Date.now() + 60_000)
    const forged = signWallLink({ ...claim, expiresAt: later }, 'another secret altogether')
    const [payload = '', signature = ''] = token.split('.')
    const bent = `${Buffer.from(JSON.stringify(['other', 'x', 'y', 9_999_999_999])).toString('base64url')}.${signature}`
    const open = async (text: string) =>
      (await server.browser().ask(api.lessons.openWall, { body: { token: text } })).status
    expect(await open(over)).toBe(410)
    expect(await open(forged)).toBe(404)
    expect(await open(bent)).toBe(404)
    expect(await open(`${payload}.${signature.slice(0, 10)}`)).toBe(404)
    expect(await open(`${token}.x`)).toBe(404)
    expect(await open('x'.repeat(201))).toBe(422)
  })

  it('ends with its time', async () => {
    const { id, token } = await link()
    const screen = server.browser()
    await screen.get(api.lessons.openWall, { body: { token } })
    await db()
      .updateTable('wallSession')
      .set({ expiresAt: new Date(Date.now() - 1) })
      .where('lessonId', '=', id)
      .execute()
    expect((await screen.ask(api.lessons.get, { params: { lessonId: id } })).status).toBe(401)
  })
})
