import { request as rawRequest } from 'node:http'
import { api } from '@/shared/api'
import { errorOf, createBrowser, type Answer } from '@/tests/support/test-browser'
import { insertCourseWith, insertPerson, signedIn } from '@/tests/support/test-people'
import { insertOpenLesson } from '@/tests/support/test-lessons'
import { startTestServer, type TestServer } from '@/tests/support/test-server'

let server: TestServer
beforeAll(async () => {
  server = await startTestServer()
})
afterAll(() => server.close())
const db = () => server.database.db

const teacherIn = async () => {
  const teacher = await insertPerson(db(), 'Ilse Marrow', { mayMakeCourses: true })
  return { teacher, browser: await signedIn(server, teacher) }
}

describe('every answer', () => {
  it.each(['/', '/api/me', '/api/nothing', '/home', '/nothing.js', '/api/auth/get-session'])(
    'to %s carries a policy without eval, without other origins, without framing',
    async (path) => {
      const { headers } = await server.browser().request('GET', path)
      const policy = headers.get('content-security-policy') ?? ''
      expect(policy).toContain("default-src 'self'")
      expect(policy).toContain("script-src 'self';")
      expect(policy).toContain("object-src 'none'")
      expect(policy).toContain("frame-ancestors 'none'")
      expect(policy).not.toMatch(/unsafe-eval|\*|https?:|upgrade-insecure/)
      expect(headers.get('x-content-type-options')).toBe('nosniff')
      expect(headers.get('referrer-policy')).toBe('no-referrer')
      expect(headers.get('x-powered-by')).toBeNull()
    },
  )

  it('of the API is not kept by caches', async () => {
    const { headers } = await server.browser().ask(api.people.me)
    expect(headers.get('cache-control')).toBe('no-store')
  })
})

describe('a request from another site', () => {
  it.each(['https://evil.example', 'null', 'http://127.0.0.1:1', 'not an origin'])(
    'with origin %s changes nothing, whoever is signed in',
    async (origin) => {
      const { browser } = await teacherIn()
      const elsewhere = createBrowser(server.url, origin)
      for (const [name, value] of browser.cookies) elsewhere.cookies.set(name, value)
      expect((await elsewhere.ask(api.courses.create, { body: { name: 'Forged' } })).status).toBe(403)
      expect((await elsewhere.auth('/sign-out', {})).status).toBe(403)
      expect((await browser.get(api.courses.list)).courses).toEqual([])
    },
  )

  it('that names no origin counts as one, unless the browser vouches that the page is ours', async () => {
    const { browser } = await teacherIn()
    const cookie = [...browser.cookies].map(([name, value]) => `${name}=${value}`).join('; ')
    const post = (headers: Record<string, string>) =>
      new Promise<number>((resolve, reject) => {
        const sent = rawRequest(
          `${server.url}/api/courses`,
          { method: 'POST', headers: { cookie, 'content-type': 'application/json', ...headers } },
          (response) => {
            response.resume()
            resolve(response.statusCode ?? 0)
          },
        )
        sent.on('error', reject)
        sent.end(JSON.stringify({ name: 'Ours' }))
      })
    expect(await post({})).toBe(403)
    expect(await post({ 'sec-fetch-site': 'cross-site' })).toBe(403)
    expect(await post({ 'sec-fetch-site': 'same-origin' })).toBe(200)
  })

  it('is taken from every configured origin', async () => {
    const open = await startTestServer({ ALLOWED_ORIGINS: 'http://192.168.7.7:8080, http://school.example' })
    try {
      const person = await insertPerson(open.database.db, 'Anna')
      const browser = createBrowser(open.url, 'http://school.example')
      expect((await browser.signIn(person.email, 'four plain words here')).status).toBe(200)
      expect((await browser.auth('/sign-out', {})).status).toBe(200)
    } finally {
      await open.close()
    }
  })
})

describe('a body', () => {
  const post = async (body: unknown, headers: Record<string, string> = {}): Promise<Answer> => {
    const { browser } = await teacherIn()
    return browser.request('POST', '/api/courses', { body, headers })
  }

  it.each([
    ['broken JSON', '{"name":', 400, 'bad-request'],
    ['no object', '"name"', 400, 'bad-request'],
    ['a list', '[1,2]', 422, 'invalid'],
    ['nothing', '', 422, 'invalid'],
    ['more than sixty-four kilobytes', JSON.stringify({ name: 'x'.repeat(70_000) }), 413, 'too-large'],
    ['a name that is no text', '{"name":{"$gt":""}}', 422, 'invalid'],
    ['a number too great', '{"name":1e999}', 422, 'invalid'],
    ['a prototype', '{"__proto__":{"isAdministrator":true},"name":"A"}', 422, 'invalid'],
    ['an unknown key', '{"name":"A","id":"mine"}', 422, 'invalid'],
    ['a NUL in the name', '{"name":"A\\u0000B"}', 422, 'invalid'],
    ['half a character', '{"name":"A\\ud800B"}', 422, 'invalid'],
  ])('of %s is refused', async (_what, body, status, code) => {
    const answer = await post(body)
    expect(errorOf(answer).code).toBe(code)
    expect(answer.status).toBe(status)
  })

  it('of another type is not read', async () => {
    expect((await post('{"name":"A"}', { 'content-type': 'text/plain' })).status).toBe(422)
  })

  it('in an unknown encoding is refused', async () => {
    expect((await post('{"name":"A"}', { 'content-encoding': 'x-none' })).status).toBe(400)
  })

  it('says the path of every field that will not do', async () => {
    const { browser } = await teacherIn()
    const answer = await browser.ask(api.cantus.create, {
      body: { title: '', notes: ['D4', 'X'], mode: 'x', final: 'D', clef: 'treble', more: { a: 1 } },
    })
    const fields = errorOf(answer).fields ?? []
    expect(fields.map(({ path, code }) => `${path}: ${code}`).sort()).toEqual([
      'mode: not-an-option',
      'more: unknown-key',
      'notes.1: wrong-form',
      'notes: too-short',
      'title: empty',
    ])
  })
})

describe('an address', () => {
  it.each([
    ['/api/courses/x', 404],
    ['/api/courses/..%2f..%2fetc', 404],
    ['/api/courses/%00%00%00%00%00%00%00%00', 404],
    [`/api/courses/${'a'.repeat(300)}`, 404],
    ['/api/courses/%E0%A4%A', 400],
    ['/api/courses/abcdefghijkl?search=x', 422],
    ['/api/me?x=1', 422],
    ['/api/nothing', 404],
    ['/api', 404],
    ['/api/join/do-re-mi', 404],
    [`/api/join/${'do-'.repeat(60)}do`, 404],
    [`/api/invitations/${'x'.repeat(200)}`, 404],
  ])('%s is answered %i', async (path, status) => {
    const { browser } = await teacherIn()
    const answer = await browser.request('GET', path)
    expect(answer.status).toBe(status)
    expect(errorOf(answer).code).toMatch(/^[a-z-]+$/)
  })

  it.each([
    ['offset', '-1'],
    ['offset', 'NaN'],
    ['offset', '1e99'],
    ['sort', 'password'],
    ['direction', 'sideways'],
    ['search', 'x'.repeat(101)],
    ['limit', '100000'],
  ])('with %s=%s is refused', async (key, value) => {
    const { teacher, browser } = await teacherIn()
    const courseId = await insertCourseWith(db(), 'Mine', { [teacher.id]: 'teacher' })
    const answer = await browser.ask(api.courses.members, { params: { courseId }, query: { [key]: value } })
    expect(answer.status).toBe(422)
    expect(errorOf(answer).fields?.[0]?.path).toBe(key)
  })
})

describe('the web client', () => {
  it('is one page for every screen’s address, never kept without asking', async () => {
    for (const path of ['/', '/home', '/courses/abc/members', '/lessons/x/wall']) {
      const { status, text, headers } = await server.browser().request('GET', path)
      expect([status, headers.get('cache-control')]).toEqual([200, 'no-cache'])
      expect(text).toContain('<title>A page for tests of the server</title>')
    }
  })

  it.each([
    '/nothing.js',
    '/.env',
    '/..%2f..%2fpackage.json',
    '/%2e%2e/package.json',
    '/.stamp',
    '/index.html/x.js',
  ])('has no %s', async (path) => {
    const { status, text } = await server.browser().request('GET', path)
    expect(status).toBe(404)
    expect(text).not.toContain('"name"')
  })

  it('takes nothing but readings', async () => {
    expect((await server.browser().request('POST', '/home', { body: {} })).status).toBe(404)
  })
})

describe('the log', () => {
  it('holds no secrets, codes, addresses or names', async () => {
    const { teacher, browser } = await teacherIn()
    const courseId = await insertCourseWith(db(), 'Logged', { [teacher.id]: 'teacher' })
    const { id, code } = await insertOpenLesson(db(), courseId, teacher.id)
    await browser.ask(api.lessons.peek, { params: { code } })
    await server.browser().ask(api.lessons.join, { body: { code, name: 'Unmistakable Guest' } })
    const { url } = await browser.get(api.lessons.createWallLink, { params: { lessonId: id } })
    await server.browser().ask(api.lessons.openWall, { body: { token: url.split('/').at(-1) } })
    await server.browser().signIn(teacher.email, 'a wrong password')
    await browser.ask(api.courses.inviteMany, {
      params: { courseId },
      body: { pasted: 'logged@school.example', role: 'student' },
    })
    await browser.request('POST', '/api/courses', { body: '{"name":' })
    const log = server.logged.join('')
    expect(log).toContain('/api/join/:code')
    const secrets = [
      ...[code, 'Unmistakable Guest', url.split('/').at(-1) ?? '', teacher.email, 'a wrong password'],
      ...['logged@school.example', 'four plain words here', ...browser.cookies.values()],
    ]
    for (const secret of secrets) expect(log).not.toContain(secret)
  })
})
