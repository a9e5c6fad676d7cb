import { people } from '@/shared/api/people'
import { errorOf } from '@/tests/support/test-browser'
import { insertPerson, PASSWORD, signedIn } from '@/tests/support/test-people'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())

/** The link in the newest message to an address. */
function linkTo(email: string): URL {
  const message = server.mail.messages().find(({ to }) => to === email)
  const link = /https?:\S+/.exec(message?.text ?? '')?.[0]
  if (!link) throw new Error(`No link was sent to ${email}`)
  return new URL(link)
}

describe('signing up', () => {
  const form = { name: 'Łukasz Ó Ría', email: 'lukasz@school.example', password: 'a long enough one' }

  it('lets nobody in before the address is confirmed, and then does', async () => {
    const browser = server.browser()
    expect((await browser.auth('/sign-up/email', form)).status).toBe(200)
    expect(browser.cookies.size).toBe(0)
    const early = await browser.signIn(form.email, form.password)
    expect(early).toMatchObject({ status: 403, body: { code: 'EMAIL_NOT_VERIFIED' } })

    const link = linkTo(form.email)
    expect(link.origin + link.pathname).toBe(`${server.config.publicUrl}/verify`)
    const token = link.searchParams.get('token') ?? ''
    expect((await browser.auth(`/verify-email?token=${token}x`)).status).toBe(401)
    expect((await browser.auth(`/verify-email?token=${token}`)).status).toBe(200)
    const { me } = await browser.get(people.me)
    expect(me).toMatchObject({ name: form.name, email: form.email, isVerified: true, isGuest: false })
    expect((await server.browser().signIn(form.email, form.password)).status).toBe(200)
  })

  it('answers the same for an address that has an account, and tells its owner by mail', async () => {
    const fresh = await server.browser().auth('/sign-up/email', { ...form, email: 'fresh@school.example' })
    const again = await server.browser().auth('/sign-up/email', { ...form, password: 'somebody else here' })
    expect(again.status).toBe(fresh.status)
    expect(Object.keys(again.body as object).sort()).toEqual(Object.keys(fresh.body as object).sort())
    expect(server.mail.messages()[0]).toMatchObject({
      to: form.email,
      subject: 'You have an account already',
    })
    expect((await server.browser().signIn(form.email, 'somebody else here')).status).toBe(401)
  })

  it.each([
    ['an empty name', { name: ' ' }, 422],
    ['a name too long', { name: 'x'.repeat(61) }, 422],
    ['a name with a control character', { name: 'Ann\u0007a' }, 422],
    ['a name that turns the writing direction', { name: 'Ann\u202ea' }, 422],
    ['a short password', { password: 'short' }, 400],
    ['no address', { email: 'nowhere' }, 400],
    ['a password too long', { password: 'x'.repeat(129) }, 400],
  ])('refuses %s', async (_what, change, status) => {
    const answer = await server
      .browser()
      .auth('/sign-up/email', { ...form, email: 'new@school.example', ...change })
    expect(answer.status).toBe(status)
  })

  it('gives nobody a role they ask for', async () => {
    const browser = server.browser()
    const email = 'climber@school.example'
    await browser.auth('/sign-up/email', { ...form, email, isAdministrator: true, mayMakeCourses: true })
    const row = await server.database.db
      .selectFrom('user')
      .select(['isAdministrator', 'mayMakeCourses', 'emailVerified'])
      .where('email', '=', email)
      .executeTakeFirst()
    expect(row ?? { isAdministrator: false, mayMakeCourses: false, emailVerified: false }).toEqual({
      isAdministrator: false,
      mayMakeCourses: false,
      emailVerified: false,
    })
  })
})

describe('a login', () => {
  it('is a cookie that scripts cannot read and other sites do not send', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const { headers } = await server.browser().signIn(person.email, PASSWORD)
    const cookie = headers.getSetCookie().find((value) => value.startsWith('bicinium.session_token='))
    expect(cookie).toMatch(/HttpOnly/i)
    expect(cookie).toMatch(/SameSite=Lax/i)
  })

  it('is another one at every sign-in', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const browser = await signedIn(server, person)
    const first = browser.cookies.get('bicinium.session_token')
    await browser.signIn(person.email, PASSWORD)
    expect(browser.cookies.get('bicinium.session_token')).not.toBe(first)
  })

  it('ends with signing out, and the cookie that is left is nobody’s', async () => {
    const browser = await signedIn(server, await insertPerson(server.database.db, 'Anna'))
    const kept = new Map(browser.cookies)
    expect((await browser.auth('/sign-out', {})).status).toBe(200)
    for (const [name, value] of kept) browser.cookies.set(name, value)
    expect((await browser.get(people.me)).me).toBeNull()
  })

  it('can be listed and ended from another one', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const phone = await signedIn(server, person)
    const laptop = await signedIn(server, person)
    const list = (await laptop.auth('/list-sessions')).body as {
      id: string
      token: string
      ipAddress: string | null
    }[]
    expect(list).toHaveLength(2)
    expect(list.every(({ ipAddress }) => !ipAddress)).toBe(true)
    const own = (await laptop.auth('/get-session')).body as { session: { id: string } }
    const other = list.find(({ id }) => id !== own.session.id)
    expect((await laptop.auth('/revoke-session', { token: other?.token })).status).toBe(200)
    expect((await phone.get(people.me)).me).toBeNull()
    expect((await laptop.get(people.me)).me).not.toBeNull()
  })

  it('cannot end the login of somebody else', async () => {
    const victim = await signedIn(server, await insertPerson(server.database.db, 'Victim'))
    const list = (await victim.auth('/list-sessions')).body as { token: string }[]
    const attacker = await signedIn(server, await insertPerson(server.database.db, 'Attacker'))
    await attacker.auth('/revoke-session', { token: list[0]?.token })
    expect((await victim.get(people.me)).me).not.toBeNull()
  })

  it('is nobody’s once it has run out', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const browser = await signedIn(server, person)
    await server.database.db
      .updateTable('session')
      .set({ expiresAt: new Date(Date.now() - 1000) })
      .where('userId', '=', person.id)
      .execute()
    expect((await browser.get(people.me)).me).toBeNull()
  })

  it.each([
    ['nothing', ''],
    ['a stranger’s writing', 'abc.def'],
    ['a token without its signature', 'E5wuIDGbkv06TONWWTbr4rVOBAXmrBJP'],
    ['three thousand characters', 'x'.repeat(3_000)],
    ['percent signs', '%%%%'],
  ])('is not made from a cookie with %s', async (_what, value) => {
    const browser = server.browser()
    browser.cookies.set('bicinium.session_token', value)
    browser.cookies.set('bicinium.wall', value)
    expect((await browser.get(people.me)).me).toBeNull()
  })
})

describe('a forgotten password', () => {
  it('is replaced by the link in the mail, once, and every login ends', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const old = await signedIn(server, person)
    const browser = server.browser()
    expect((await browser.auth('/request-password-reset', { email: person.email })).status).toBe(200)
    const link = linkTo(person.email)
    expect(link.pathname).toBe('/reset')
    const token = link.searchParams.get('token')
    const newPassword = 'a wholly new one'
    expect((await browser.auth('/reset-password', { token, newPassword: 'short' })).status).toBe(400)
    expect((await browser.auth('/reset-password', { token, newPassword })).status).toBe(200)
    expect((await browser.auth('/reset-password', { token, newPassword: 'once more, please' })).status).toBe(
      400,
    )
    expect((await old.get(people.me)).me).toBeNull()
    expect((await browser.signIn(person.email, PASSWORD)).status).toBe(401)
    expect((await browser.signIn(person.email, newPassword)).status).toBe(200)
  })

  it('answers alike for an address without an account, and sends it nothing', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const known = await server.browser().auth('/request-password-reset', { email: person.email })
    const unknown = await server.browser().auth('/request-password-reset', { email: 'nobody@school.example' })
    expect(unknown.status).toBe(known.status)
    expect(unknown.text).toBe(known.text)
    expect(server.mail.messages().some(({ to }) => to === 'nobody@school.example')).toBe(false)
  })

  it('is not mailed about without end', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const statuses: number[] = []
    for (let times = 0; times < 8; times += 1) {
      statuses.push((await server.browser().auth('/request-password-reset', { email: person.email })).status)
    }
    expect(statuses.at(-1)).toBe(429)
    expect(server.mail.messages().filter(({ to }) => to === person.email).length).toBeLessThan(8)
  })
})

describe('signing in', () => {
  it('lets a class of 27 in from one address within moments', async () => {
    const pupils = await Promise.all(
      Array.from({ length: 27 }, (_, index) => insertPerson(server.database.db, `Pupil ${index}`)),
    )
    const answers = await Promise.all(pupils.map(({ email }) => server.browser().signIn(email, PASSWORD)))
    expect(answers.map(({ status }) => status)).toEqual(Array(27).fill(200))
  })

  it('locks an account that is being guessed, even for a burst, and no other', async () => {
    const victim = await insertPerson(server.database.db, 'Victim')
    const guesses = await Promise.all(
      Array.from({ length: 30 }, (_, index) =>
        server.browser().signIn(victim.email, `guess number ${index}`),
      ),
    )
    const statuses = guesses.map(({ status }) => status)
    expect(statuses.filter((status) => status === 401)).toHaveLength(10)
    expect(statuses.filter((status) => status === 429)).toHaveLength(20)
    const right = await server.browser().signIn(victim.email, PASSWORD)
    expect(right.status).toBe(429)
    expect(errorOf(right)).toMatchObject({ code: 'too-many-tries' })
    expect(errorOf(right).retryAfterSeconds).toBeGreaterThan(0)
    const other = await insertPerson(server.database.db, 'Other')
    expect((await server.browser().signIn(other.email, PASSWORD)).status).toBe(200)
  })

  it('forgives a few wrong tries before the right one', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    for (let round = 0; round < 3; round += 1) {
      for (let wrong = 0; wrong < 5; wrong += 1) {
        expect((await server.browser().signIn(person.email, 'not this one')).status).toBe(401)
      }
      expect((await server.browser().signIn(person.email, PASSWORD)).status).toBe(200)
    }
  })

  it('answers alike for a wrong password and an unknown address', async () => {
    const person = await insertPerson(server.database.db, 'Anna')
    const wrong = await server.browser().signIn(person.email, 'not this one')
    const unknown = await server.browser().signIn('nobody@school.example', 'not this one')
    expect([unknown.status, unknown.text]).toEqual([wrong.status, wrong.text])
  })
})

describe('the sign-in library', () => {
  it.each([
    '/sign-in/anonymous',
    '/sign-in/social',
    '/delete-user',
    '/change-email',
    '/link-social',
    '/ok',
    '/error',
    '/delete-anonymous-user',
    '/callback/x',
    '//sign-in/anonymous',
    '/sign-in/anonymous/',
  ])('does not serve %s', async (path) => {
    expect((await server.browser().auth(path, {})).status).toBe(404)
    expect((await server.browser().auth(path)).status).toBe(404)
  })

  it('asks for no other tables than ours', async () => {
    const { getMigrations } = await import('better-auth/db/migration')
    const { toBeAdded, toBeCreated } = await getMigrations(server.server.auth.options)
    expect({ toBeAdded, toBeCreated }).toEqual({ toBeAdded: [], toBeCreated: [] })
  })

  it('sets cookies that need https where the server is reached by https', async () => {
    const secure = await startTestServer({ PUBLIC_URL: 'https://school.example' })
    try {
      const person = await insertPerson(secure.database.db, 'Anna')
      const { headers } = await secure.browser().signIn(person.email, PASSWORD)
      const cookie = headers.getSetCookie().find((value) => value.includes('session_token'))
      expect(cookie).toMatch(/^__Secure-bicinium\.session_token=/)
      expect(cookie).toMatch(/; Secure/i)
      expect(headers.get('strict-transport-security')).toMatch(/max-age=\d{6,}/)
    } finally {
      await secure.close()
    }
  })
})
