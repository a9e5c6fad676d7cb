import { api } from '@/shared/api'
import { MAX_INVITATIONS_AT_ONCE } from '@/shared/api/courses'
import { errorOf, type TestBrowser } from '@/tests/support/test-browser'
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
})
beforeEach(async () => {
  courseId = await insertCourseWith(db(), 'Counterpoint I', { [teacher.id]: 'teacher' })
})
afterAll(() => server.close())

const invite = (pasted: string, role = 'student') =>
  leader.get(api.courses.inviteMany, { params: { courseId }, body: { pasted, role } })

const tokenTo = (email: string): string => {
  const message = server.mail.messages().find(({ to }) => to === email)
  return /invitations\/(\S+)/.exec(message?.text ?? '')?.[1] ?? ''
}

const roleOf = async (person: TestPerson) => {
  const { items } = await leader.get(api.courses.members, {
    params: { courseId },
    query: { search: person.email },
  })
  return items[0]?.role
}

describe('invitations by mail', () => {
  it('go to every address in what was pasted, and say what became of each', async () => {
    const member = await insertPerson(db(), 'Member', { email: 'member@school.example' })
    await db().insertInto('courseMember').values({ courseId, userId: member.id, role: 'student' }).execute()
    const outcome = await invite(
      'Anna Müller <Anna@School.example>; "Brandt, Teo" <teo@school.example>\nmember@school.example, nonsense\nmailto:zoe@school.example',
    )
    expect(outcome).toEqual({
      sent: ['anna@school.example', 'teo@school.example', 'zoe@school.example'],
      already: ['member@school.example'],
      refused: [{ text: 'nonsense', why: 'not-an-address' }],
    })
  })

  it('let in the person they were sent to, once, in the role they name', async () => {
    const person = await insertPerson(db(), 'Teo')
    await invite(person.email, 'assistant')
    const token = tokenTo(person.email)
    expect(await server.browser().get(api.courses.peekInvitation, { params: { token } })).toEqual({
      courseName: 'Counterpoint I',
      role: 'assistant',
      invitedBy: 'Ilse Marrow',
      email: person.email,
    })
    const browser = await signedIn(server, person)
    expect(await browser.get(api.courses.acceptInvitation, { params: { token } })).toEqual({ courseId })
    expect(await roleOf(person)).toBe('assistant')
    expect((await browser.ask(api.courses.acceptInvitation, { params: { token } })).status).toBe(404)
  })

  it('do not let in somebody they were forwarded to', async () => {
    await invite('meant@school.example')
    const other = await signedIn(server, await insertPerson(db(), 'Other'))
    const token = tokenTo('meant@school.example')
    expect((await other.ask(api.courses.acceptInvitation, { params: { token } })).status).toBe(403)
  })

  it('replace an earlier one to the same address', async () => {
    const person = await insertPerson(db(), 'Zoë')
    await invite(person.email)
    const first = tokenTo(person.email)
    await invite(person.email, 'assistant')
    const browser = await signedIn(server, person)
    expect((await browser.ask(api.courses.acceptInvitation, { params: { token: first } })).status).toBe(404)
    await browser.get(api.courses.acceptInvitation, { params: { token: tokenTo(person.email) } })
    expect(await roleOf(person)).toBe('assistant')
  })

  it('are told as failed, and forgotten, when the provider takes none', async () => {
    server.mail.setRefusing(true)
    try {
      const outcome = await invite('late@school.example')
      expect(outcome).toMatchObject({
        sent: [],
        refused: [{ text: 'late@school.example', why: 'mail-failed' }],
      })
      const { invitations } = await leader.get(api.courses.invitations, { params: { courseId } })
      expect(invitations).toEqual([])
    } finally {
      server.mail.setRefusing(false)
    }
  })

  it('are refused past the number that may go at once', async () => {
    const pasted = Array.from(
      { length: MAX_INVITATIONS_AT_ONCE + 1 },
      (_, index) => `p${index}@s.example`,
    ).join('\n')
    const answer = await leader.ask(api.courses.inviteMany, {
      params: { courseId },
      body: { pasted, role: 'student' },
    })
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.[0]).toMatchObject({ path: 'pasted', code: 'too-many' })
  })
})

describe('invitations by link', () => {
  const createLink = async (role = 'student') => {
    const { invitation } = await leader.get(api.courses.createLink, { params: { courseId }, body: { role } })
    return { ...invitation, token: invitation.url?.split('/').at(-1) ?? '' }
  }

  it('let in everybody who has them, until withdrawn', async () => {
    const { id, token, url } = await createLink()
    expect(url).toMatch(new RegExp(`^${server.config.publicUrl}/invitations/[A-Za-z0-9_-]{43}$`))
    for (const name of ['One', 'Two']) {
      const browser = await signedIn(server, await insertPerson(db(), name))
      await browser.get(api.courses.acceptInvitation, { params: { token } })
    }
    await leader.get(api.courses.withdrawInvitation, { params: { courseId, invitationId: id } })
    const late = await signedIn(server, await insertPerson(db(), 'Late'))
    expect((await late.ask(api.courses.acceptInvitation, { params: { token } })).status).toBe(404)
  })

  it('are shown once and kept as a hash', async () => {
    const { token } = await createLink()
    const { invitations } = await leader.get(api.courses.invitations, { params: { courseId } })
    expect(invitations.map(({ url }) => url)).toEqual([null])
    const rows = await db().selectFrom('invitation').selectAll().where('courseId', '=', courseId).execute()
    expect(JSON.stringify(rows)).not.toContain(token)
  })

  it('take no role away', async () => {
    const { token } = await createLink('student')
    await leader.get(api.courses.acceptInvitation, { params: { token } })
    expect(await roleOf(teacher)).toBe('teacher')
  })

  it('let nobody in whose address is not confirmed', async () => {
    const { token } = await createLink()
    const person = await insertPerson(db(), 'New')
    const browser = await signedIn(server, person)
    await db().updateTable('user').set({ emailVerified: false }).where('id', '=', person.id).execute()
    const answer = await browser.ask(api.courses.acceptInvitation, { params: { token } })
    expect(errorOf(answer).code).toBe('address-unverified')
  })

  it('end with their time, and with the course', async () => {
    const { token, id } = await createLink()
    await leader.get(api.courses.update, { params: { courseId }, body: { isArchived: true } })
    expect(errorOf(await server.browser().ask(api.courses.peekInvitation, { params: { token } })).code).toBe(
      'ended',
    )
    await leader.get(api.courses.update, { params: { courseId }, body: { isArchived: false } })
    await db()
      .updateTable('invitation')
      .set({ expiresAt: new Date(Date.now() - 1) })
      .where('id', '=', id)
      .execute()
    expect((await server.browser().ask(api.courses.peekInvitation, { params: { token } })).status).toBe(404)
  })
})
