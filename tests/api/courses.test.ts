import { api } from '@/shared/api'
import { PAGE_SIZE } from '@/shared/api/fields'
import { errorOf, type TestBrowser } from '@/tests/support/test-browser'
import { insertOpenLesson } from '@/tests/support/test-lessons'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
let teacher: TestPerson
let leader: TestBrowser
const db = () => server.database.db

beforeAll(async () => {
  server = await startTestServer()
  teacher = await insertPerson(db(), 'Ilse Marrow', { mayMakeCourses: true })
  leader = await signedIn(server, teacher)
})
afterAll(() => server.close())

describe('a course', () => {
  it('is made, renamed, put away and taken up again by its teacher', async () => {
    const { course } = await leader.get(api.courses.create, { body: { name: '  Counterpoint I  ' } })
    expect(course).toMatchObject({ name: 'Counterpoint I', myRole: 'teacher', members: 1, lessons: 0 })
    const params = { courseId: course.id }
    const renamed = await leader.get(api.courses.update, { params, body: { name: 'Counterpoint II' } })
    expect(renamed.course.name).toBe('Counterpoint II')
    const away = await leader.get(api.courses.update, { params, body: { isArchived: true } })
    expect(away.course).toMatchObject({ isArchived: true, name: 'Counterpoint II' })
    const invite = await leader.ask(api.courses.createLink, { params, body: { role: 'student' } })
    expect(errorOf(invite).code).toBe('conflict')
    await leader.get(api.courses.update, { params, body: { isArchived: false } })
    await leader.get(api.courses.update, { params, body: {} })
  })

  it('tells of a lesson that is going on', async () => {
    const courseId = await insertCourseWith(db(), 'Live', { [teacher.id]: 'teacher' })
    const { id } = await insertOpenLesson(db(), courseId, teacher.id)
    const { course } = await leader.get(api.courses.get, { params: { courseId } })
    expect(course.openLesson).toEqual({ id, title: 'A lesson' })
  })

  it('never loses its last teacher, even when two step down at once', async () => {
    const second = await insertPerson(db(), 'Second')
    const courseId = await insertCourseWith(db(), 'Two', { [teacher.id]: 'teacher', [second.id]: 'teacher' })
    const other = await signedIn(server, second)
    const answers = await Promise.all([
      leader.ask(api.courses.updateMember, {
        params: { courseId, userId: teacher.id },
        body: { role: 'student' },
      }),
      other.ask(api.courses.removeMember, { params: { courseId, userId: second.id } }),
    ])
    expect(answers.map(({ status }) => status).sort()).toEqual([200, 409])
  })

  it('may be left by anybody but its last teacher', async () => {
    const pupil = await insertPerson(db(), 'Pupil')
    const courseId = await insertCourseWith(db(), 'Left', { [teacher.id]: 'teacher', [pupil.id]: 'student' })
    const browser = await signedIn(server, pupil)
    await browser.get(api.courses.removeMember, { params: { courseId, userId: pupil.id } })
    expect((await browser.ask(api.courses.get, { params: { courseId } })).status).toBe(404)
    const last = await leader.ask(api.courses.removeMember, { params: { courseId, userId: teacher.id } })
    expect(errorOf(last)).toMatchObject({ code: 'conflict', fields: [{ code: 'last-teacher' }] })
  })
})

describe('the roster', () => {
  let courseId: string
  const NAMES = ['Zoë', 'Émile', 'emil', 'Åsa', 'Łukasz', '100%_sure', 'Þór']
  beforeAll(async () => {
    const people = await Promise.all([
      ...NAMES.map((name) => insertPerson(db(), name)),
      ...Array.from({ length: PAGE_SIZE + 10 }, (_, index) =>
        insertPerson(db(), `Pupil ${String(index).padStart(3, '0')}`),
      ),
    ])
    courseId = await insertCourseWith(db(), 'Big', {
      [teacher.id]: 'teacher',
      ...Object.fromEntries(people.map(({ id }) => [id, 'student' as const])),
    })
  })
  const roster = (query: Record<string, string> = {}) =>
    leader.get(api.courses.members, { params: { courseId }, query })
  const names = async (query: Record<string, string>) => (await roster(query)).items.map(({ name }) => name)

  it('comes in pages that hold everybody once', async () => {
    const first = await roster()
    expect(first.items).toHaveLength(PAGE_SIZE)
    expect(first.total).toBe(PAGE_SIZE + 10 + NAMES.length + 1)
    const second = await roster({ offset: String(first.nextOffset) })
    expect(second.nextOffset).toBeNull()
    const ids = [...first.items, ...second.items].map(({ userId }) => userId)
    expect(new Set(ids).size).toBe(first.total)
    expect((await roster({ offset: '1000' })).items).toEqual([])
  })

  it('is searched without regard to accents and case, and nothing in a search is a pattern', async () => {
    expect(await names({ search: 'EMIL' })).toEqual(['emil', 'Émile'])
    expect(await names({ search: 'zoe' })).toEqual(['Zoë'])
    expect(await names({ search: '%_' })).toEqual(['100%_sure'])
    expect(await names({ search: "'; --" })).toEqual([])
  })

  it('is sorted as readers expect it, both ways', async () => {
    const up = await names({ sort: 'name' })
    expect(up.indexOf('Åsa')).toBeLessThan(up.indexOf('emil'))
    const down = await names({ sort: 'name', direction: 'down' })
    expect(down.slice(0, 2)).toEqual(['Þór', 'Zoë'])
    expect((await names({ sort: 'role' }))[0]).toBe('Ilse Marrow')
    expect((await names({ sort: 'role', direction: 'down' }))[0]).not.toBe('Ilse Marrow')
  })
})

describe('people', () => {
  it('are listed for the administrator, without guests, and may be let make courses', async () => {
    const admin = await signedIn(server, await insertPerson(db(), 'Nadia Quill', { isAdministrator: true }))
    const courseId = await insertCourseWith(db(), 'Open', { [teacher.id]: 'teacher' })
    const { code } = await insertOpenLesson(db(), courseId, teacher.id)
    await server.browser().get(api.lessons.join, { body: { code, name: 'Ghost guest' } })
    expect((await admin.get(api.people.list, { query: { search: 'ghost' } })).total).toBe(0)

    const person = await insertPerson(db(), 'New Teacher')
    const browser = await signedIn(server, person)
    expect((await browser.ask(api.courses.create, { body: { name: 'Mine' } })).status).toBe(403)
    const changed = await admin.get(api.people.update, {
      params: { userId: person.id },
      body: { mayMakeCourses: true },
    })
    expect(changed).toMatchObject({ name: 'New Teacher', mayMakeCourses: true, courses: 0 })
    expect((await browser.ask(api.courses.create, { body: { name: 'Mine' } })).status).toBe(200)
  })
})
