/**
 * Every request of the endpoint table as everybody: who is answered, who is refused, and to whom it does not even
 * exist. A request that is missing here fails the first test.
 */
import { createId } from '@/db/create-id'
import { insertCantus } from '@/db/queries/cantus'
import { insertLinkInvitation } from '@/db/queries/invitations'
import { insertRuleSet } from '@/db/queries/rule-sets'
import { createToken, hashToken } from '@/server/auth/token'
import { api } from '@/shared/api'
import type { TestBrowser } from '@/tests/support/test-browser'
import { testExercise, testStage } from '@/tests/support/test-exercise'
import { insertOpenLesson, insertPreparedLesson } from '@/tests/support/test-lessons'
import { insertCourseWith, insertPerson, signedIn, type TestPerson } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

const WHO = [
  'administrator',
  'teacher',
  'assistant',
  'student',
  /** Teacher of another course. */
  'stranger',
  /** Guest of this very lesson, by its code. */
  'guest',
  /** Guest of a lesson of another course. */
  'otherGuest',
  /** A screen that shows this lesson. */
  'wall',
  /** A screen that shows a lesson of another course. */
  'otherWall',
  'nobody',
  /** A teacher whose login has run out. */
  'expired',
] as const
type Who = (typeof WHO)[number]

let server: TestServer
let courseId: string
let lessonId: string
let code: string
const browsers = {} as Record<Who, TestBrowser>
const peopleOf = {} as Record<'administrator' | 'teacher' | 'assistant' | 'student' | 'stranger', TestPerson>

const db = () => server.database.db

async function openWall(leader: TestBrowser, lesson: string): Promise<TestBrowser> {
  const { url } = await leader.get(api.lessons.createWallLink, { params: { lessonId: lesson } })
  const screen = server.browser()
  await screen.get(api.lessons.openWall, { body: { token: url.split('/').at(-1) } })
  return screen
}

beforeAll(async () => {
  server = await startTestServer()
  peopleOf.administrator = await insertPerson(db(), 'Nadia Quill', { isAdministrator: true })
  peopleOf.teacher = await insertPerson(db(), 'Ilse Marrow', { mayMakeCourses: true })
  peopleOf.assistant = await insertPerson(db(), 'Teo Brandt')
  peopleOf.student = await insertPerson(db(), 'Zoë Ashdown')
  peopleOf.stranger = await insertPerson(db(), 'Someone Else', { mayMakeCourses: true })
  courseId = await insertCourseWith(db(), 'Counterpoint', {
    [peopleOf.teacher.id]: 'teacher',
    [peopleOf.assistant.id]: 'assistant',
    [peopleOf.student.id]: 'student',
  })
  const otherCourse = await insertCourseWith(db(), 'Another', { [peopleOf.stranger.id]: 'teacher' })
  ;({ id: lessonId, code } = await insertOpenLesson(db(), courseId, peopleOf.teacher.id))
  const other = await insertOpenLesson(db(), otherCourse, peopleOf.stranger.id)
  for (const who of ['administrator', 'teacher', 'assistant', 'student', 'stranger'] as const) {
    browsers[who] = await signedIn(server, peopleOf[who])
  }
  browsers.guest = server.browser()
  await browsers.guest.get(api.lessons.join, { body: { code, name: 'Guest' } })
  browsers.otherGuest = server.browser()
  await browsers.otherGuest.get(api.lessons.join, { body: { code: other.code, name: 'Guest' } })
  browsers.wall = await openWall(browsers.teacher, lessonId)
  browsers.otherWall = await openWall(browsers.stranger, other.id)
  browsers.nobody = server.browser()
  browsers.expired = await signedIn(server, peopleOf.teacher)
  const { session } = (await browsers.expired.auth('/get-session')).body as { session: { id: string } }
  await db()
    .updateTable('session')
    .set({ expiresAt: new Date(Date.now() - 1000) })
    .where('id', '=', session.id)
    .execute()
})
afterAll(() => server.close())

type Input = Readonly<{ params?: Record<string, string>; body?: unknown }>
const inCourse = async (): Promise<Input> => ({ params: { courseId } })
const inLesson = async (): Promise<Input> => ({ params: { lessonId } })

const melody = {
  title: 'A melody',
  notes: ['D4', 'F4', 'E4', 'D4'],
  mode: 'dorian',
  final: 'D',
  clef: 'treble',
  source: '',
  courseId: null,
} as const

const teachersCantus = async (): Promise<Input> => {
  const { id } = await insertCantus(db(), peopleOf.teacher.id, { ...melody, notes: [...melody.notes] })
  return { params: { cantusId: id }, body: melody }
}
const fewRules = {
  name: 'A few rules',
  basedOn: 'starter',
  rules: { 'par-perfect': { level: 'law' as const } },
}
const teachersRuleSet = async (): Promise<Input> => {
  const { id } = await insertRuleSet(db(), peopleOf.teacher.id, { ...fewRules, courseId: null })
  return { params: { ruleSetId: id }, body: fewRules }
}
const sharedRuleSet = async (): Promise<Input> => {
  const { id } = await insertRuleSet(db(), peopleOf.teacher.id, { ...fewRules, courseId })
  return { params: { ruleSetId: id } }
}
const freshMember = async (): Promise<Input> => {
  const { id } = await insertPerson(db(), 'A pupil')
  await db().insertInto('courseMember').values({ courseId, userId: id, role: 'student' }).execute()
  return { params: { courseId, userId: id } }
}
const freshInvitation = async (): Promise<Input> => {
  const token = createToken()
  const { id } = await insertLinkInvitation(db(), {
    courseId: await insertCourseWith(db(), 'By link', {}),
    role: 'student',
    tokenHash: hashToken(token),
    invitedBy: peopleOf.teacher.id,
    expiresAt: new Date(Date.now() + 60_000),
  })
  return { params: { token, invitationId: id } }
}
const courseInvitation = async (): Promise<Input> => {
  const { id } = await insertLinkInvitation(db(), {
    courseId,
    role: 'student',
    tokenHash: hashToken(createToken()),
    invitedBy: peopleOf.teacher.id,
    expiresAt: new Date(Date.now() + 60_000),
  })
  return { params: { courseId, invitationId: id } }
}
const preparedLesson = async (): Promise<Input> => ({
  params: { lessonId: await insertPreparedLesson(db(), courseId, peopleOf.teacher.id) },
})
const openLesson = async (): Promise<Input> => ({
  params: { lessonId: (await insertOpenLesson(db(), courseId, peopleOf.teacher.id)).id },
})

const with_ = (input: () => Promise<Input>, body: unknown) => async () => ({ ...(await input()), body })

/** Statuses in the order of WHO: administrator teacher assistant student stranger guest otherGuest wall otherWall nobody expired. */
const TABLE: Readonly<Record<string, readonly [input: () => Promise<Input>, statuses: string]>> = {
  'people.me': [async () => ({}), '200 200 200 200 200 200 200 200 200 200 200'],
  'people.list': [async () => ({}), '200 403 403 403 403 403 403 401 401 401 401'],
  'people.update': [
    async () => ({
      params: { userId: (await insertPerson(db(), 'A person')).id },
      body: { mayMakeCourses: true },
    }),
    '200 403 403 403 403 403 403 401 401 401 401',
  ],
  'courses.list': [async () => ({}), '200 200 200 200 200 403 403 401 401 401 401'],
  'courses.create': [async () => ({ body: { name: 'New' } }), '200 200 403 403 200 403 403 401 401 401 401'],
  'courses.get': [inCourse, '200 200 200 200 404 403 403 401 401 401 401'],
  'courses.update': [
    with_(inCourse, { name: 'Counterpoint' }),
    '200 200 403 403 404 403 403 401 401 401 401',
  ],
  'courses.members': [inCourse, '200 200 200 403 404 403 403 401 401 401 401'],
  'courses.updateMember': [
    with_(freshMember, { role: 'assistant' }),
    '200 200 403 403 404 403 403 401 401 401 401',
  ],
  'courses.removeMember': [freshMember, '200 200 403 403 404 403 403 401 401 401 401'],
  'courses.invitations': [inCourse, '200 200 403 403 404 403 403 401 401 401 401'],
  'courses.inviteMany': [
    with_(inCourse, { pasted: 'new@school.example', role: 'student' }),
    '200 200 403 403 404 403 403 401 401 401 401',
  ],
  'courses.createLink': [with_(inCourse, { role: 'student' }), '200 200 403 403 404 403 403 401 401 401 401'],
  'courses.withdrawInvitation': [courseInvitation, '200 200 403 403 404 403 403 401 401 401 401'],
  'courses.peekInvitation': [freshInvitation, '200 200 200 200 200 200 200 200 200 200 200'],
  'courses.acceptInvitation': [freshInvitation, '200 200 200 200 200 403 403 401 401 401 401'],
  'cantus.list': [async () => ({}), '200 200 200 200 200 403 403 401 401 401 401'],
  'cantus.get': [
    async () => ({ params: (await teachersCantus()).params ?? {} }),
    '404 200 404 404 404 403 403 401 401 401 401',
  ],
  'cantus.create': [async () => ({ body: melody }), '200 200 200 403 200 403 403 401 401 401 401'],
  'cantus.update': [teachersCantus, '404 200 404 404 404 403 403 401 401 401 401'],
  'cantus.remove': [
    async () => ({ params: (await teachersCantus()).params ?? {} }),
    '404 200 404 404 404 403 403 401 401 401 401',
  ],
  'ruleSets.list': [async () => ({}), '200 200 200 200 200 403 403 401 401 401 401'],
  'ruleSets.get': [sharedRuleSet, '404 200 200 404 404 403 403 401 401 401 401'],
  'ruleSets.create': [async () => ({ body: fewRules }), '200 200 200 403 200 403 403 401 401 401 401'],
  'ruleSets.import': [
    async () => ({ body: { version: 1, ...fewRules } }),
    '200 200 200 403 200 403 403 401 401 401 401',
  ],
  'ruleSets.update': [teachersRuleSet, '404 200 404 404 404 403 403 401 401 401 401'],
  'ruleSets.remove': [
    async () => ({ params: (await sharedRuleSet()).params ?? {} }),
    '404 200 403 404 404 403 403 401 401 401 401',
  ],
  'lessons.list': [inCourse, '200 200 200 200 404 403 403 401 401 401 401'],
  'lessons.create': [
    with_(inCourse, { title: 'New', exercise: testExercise(), stage: testStage() }),
    '403 200 200 403 404 403 403 401 401 401 401',
  ],
  'lessons.get': [inLesson, '200 200 200 200 404 200 404 200 404 401 401'],
  'lessons.update': [with_(inLesson, { title: 'A lesson' }), '403 200 200 403 404 403 404 403 404 401 401'],
  'lessons.open': [preparedLesson, '403 200 200 404 404 404 404 404 404 401 401'],
  'lessons.end': [openLesson, '403 200 200 403 404 404 404 404 404 401 401'],
  'lessons.remove': [preparedLesson, '200 200 403 404 404 404 404 404 404 401 401'],
  'lessons.enter': [inLesson, '403 200 200 200 404 200 404 200 404 401 401'],
  'lessons.roster': [inLesson, '403 200 200 403 404 403 404 403 404 401 401'],
  'lessons.createWallLink': [inLesson, '403 200 200 403 404 403 404 403 404 401 401'],
  'lessons.openWall': [
    async () => {
      const { url } = await browsers.teacher.get(api.lessons.createWallLink, { params: { lessonId } })
      return { body: { token: url.split('/').at(-1) } }
    },
    '200 200 200 200 200 200 200 200 200 200 200',
  ],
  'lessons.peek': [async () => ({ params: { code } }), '200 200 200 200 200 200 200 200 200 200 200'],
  'lessons.join': [
    async () => ({ body: { code, name: `Guest ${createId()}` } }),
    '200 200 200 200 200 200 200 200 200 200 200',
  ],
  'demo.mail': [async () => ({}), '200 200 200 200 200 200 200 200 200 200 200'],
  'demo.people': [async () => ({}), '200 200 200 200 200 200 200 200 200 200 200'],
}

const ENDPOINTS = Object.entries(api).flatMap(([resource, endpoints]) =>
  Object.entries(endpoints).map(([name, endpoint]) => ({ name: `${resource}.${name}`, endpoint })),
)

/** These change who a browser is: a copy of its cookies is used. */
const copyOf = (browser: TestBrowser): TestBrowser => {
  const copy = server.browser()
  for (const [name, value] of browser.cookies) copy.cookies.set(name, value)
  return copy
}

describe('permissions', () => {
  it('are laid down for every request there is', () => {
    expect(Object.keys(TABLE).sort()).toEqual(ENDPOINTS.map(({ name }) => name).sort())
  })

  it.each(ENDPOINTS)('$name answers each as the table says', async ({ name, endpoint }) => {
    const [input, statuses] = TABLE[name] ?? [inCourse, '']
    const got: Record<string, number> = {}
    for (const who of WHO) got[who] = (await copyOf(browsers[who]).ask(endpoint, await input())).status
    expect(got).toEqual(
      Object.fromEntries(WHO.map((who, index) => [who, Number(statuses.split(' ')[index])])),
    )
  })

  it('are asked before anything is said about what was sent', async () => {
    const endpoint = api.courses.update
    const stranger = await browsers.stranger.ask(endpoint, {
      params: { courseId },
      body: { name: 'Mine now' },
    })
    const unknown = await browsers.stranger.ask(endpoint, {
      params: { courseId: createId() },
      body: { name: 'Mine now' },
    })
    expect([stranger.status, stranger.text]).toEqual([unknown.status, unknown.text])
  })

  it('keep the code of a lesson from those who need not tell it', async () => {
    const guest = server.browser()
    await guest.get(api.lessons.join, { body: { code, name: 'Another guest' } })
    for (const browser of [browsers.student, browsers.administrator, guest]) {
      const { lesson } = await browser.get(api.lessons.get, { params: { lessonId } })
      expect(lesson.code).toBeNull()
    }
    for (const who of ['teacher', 'assistant', 'wall'] as const) {
      const { lesson } = await browsers[who].get(api.lessons.get, { params: { lessonId } })
      expect(lesson.code).toBe(code)
    }
  })

  it('tell addresses to teachers and administrators only', async () => {
    const asked = { params: { courseId } }
    const toTeacher = await browsers.teacher.get(api.courses.members, asked)
    expect(toTeacher.items.every(({ email }) => email !== null)).toBe(true)
    const toAssistant = await browsers.assistant.get(api.courses.members, asked)
    expect(toAssistant.items.every(({ email }) => email === null)).toBe(true)
    const search = peopleOf.student.email.split('@')[0] ?? ''
    const found = await browsers.assistant.get(api.courses.members, { ...asked, query: { search } })
    expect(found.total).toBe(0)
  })

  it('keep a lesson in preparation from students', async () => {
    const { params } = await preparedLesson()
    const { lessons } = await browsers.student.get(api.lessons.list, { params: { courseId } })
    expect(lessons.some(({ status }) => status === 'prepared')).toBe(false)
    expect((await browsers.student.ask(api.lessons.get, { params })).status).toBe(404)
  })

  it('leave a screen a wall, even while a student is signed in on it', async () => {
    const machine = copyOf(browsers.student)
    machine.cookies.set('bicinium.wall', browsers.wall.cookies.get('bicinium.wall') ?? '')
    const entered = await machine.get(api.lessons.enter, { params: { lessonId } })
    expect(entered).toMatchObject({ role: 'wall', memberId: null })
  })

  it('outside the demo serve no mail and no people of it', async () => {
    const school = await startTestServer({
      DEMO: '0',
      RESEND_API_KEY: 're_test',
      ADMIN_EMAIL: 'head@school.example',
    })
    try {
      expect((await school.browser().ask(api.demo.mail)).status).toBe(404)
      expect((await school.browser().ask(api.demo.people)).status).toBe(404)
    } finally {
      await school.close()
    }
  })
})
