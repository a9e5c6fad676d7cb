import { createApiClient, readRefusal, urlOf } from '@/components/api/call'
import { firstProblems } from '@/components/api/first-problems'
import { api } from '@/shared/api'

const answering = (status: number, body: string, seen: unknown[] = []) =>
  createApiClient((async (...args: unknown[]) => {
    seen.push(args)
    return new Response(body, { status })
  }) as typeof fetch)

describe('the client of the endpoint table', () => {
  test('fills placeholders and queries so that nothing in them can change the path', () => {
    expect(urlOf('/api/courses/:courseId', { params: { courseId: '../people?x' } })).toBe(
      '/api/courses/..%2Fpeople%3Fx',
    )
    expect(urlOf('/api/people', { query: { offset: 0, search: 'a&b=c', sort: undefined, other: '' } })).toBe(
      '/api/people?offset=0&search=a%26b%3Dc',
    )
  })

  test('sends the body as JSON and gives the answer as a value', async () => {
    const seen: unknown[] = []
    const call = answering(200, '{"course":{"id":"x"}}', seen)
    const result = await call(api.courses.create, { body: { name: 'A' } })
    expect(result).toEqual({ ok: true, value: { course: { id: 'x' } } })
    expect(seen).toEqual([
      [
        '/api/courses',
        expect.objectContaining({
          method: 'POST',
          body: '{"name":"A"}',
          headers: { 'content-type': 'application/json' },
        }),
      ],
    ])
  })

  test.each([
    [422, '{"error":{"code":"invalid","fields":[{"path":"name","code":"empty"}]}}', 'invalid', 1],
    [429, '{"error":{"code":"too-many-tries","retryAfterSeconds":9}}', 'too-many-tries', 0],
    [502, '<html>a proxy</html>', 'unavailable', 0],
    [500, '', 'internal', 0],
    [404, '<html>a proxy</html>', 'bad-reply', 0],
    [403, '{"error":{"code":"made-up"}}', 'bad-reply', 0],
    [200, '<html>a login page of the school</html>', 'bad-reply', 0],
  ])('status %i with body %j is the refusal %s', async (status, body, code, fields) => {
    const result = await answering(status, body)(api.people.me, {})
    expect(result.ok).toBe(false)
    if (result.ok) return
    expect(result.reason.code).toBe(code)
    expect(result.reason.fields).toHaveLength(fields)
  })

  test('a network that is not there is a refusal too', async () => {
    const call = createApiClient(() => Promise.reject(new TypeError('Failed to fetch')))
    expect(await call(api.people.me, {})).toEqual({
      ok: false,
      reason: { code: 'offline', fields: [], retryAfterSeconds: null },
    })
  })

  test('an abort is thrown, for whoever aborted to swallow', async () => {
    const abort = new AbortController()
    abort.abort()
    const call = createApiClient(() => Promise.reject(new DOMException('', 'AbortError')))
    await expect(call(api.people.me, {}, { signal: abort.signal })).rejects.toThrow()
  })

  test('waiting time is kept', () => {
    expect(
      readRefusal(429, { error: { code: 'too-many-tries', retryAfterSeconds: 9 } }).retryAfterSeconds,
    ).toBe(9)
  })
})

describe('judging a form before it is sent', () => {
  test('names the first problem of each field by its code, with its limit', () => {
    const schema = api.courses.create.body
    if (!schema) throw new Error('no body')
    expect(firstProblems(schema, { name: ' ' })).toEqual([
      expect.objectContaining({ path: 'name', code: 'empty' }),
    ])
    expect(firstProblems(schema, { name: 'a'.repeat(121) })).toEqual([
      expect.objectContaining({ path: 'name', code: 'too-long', args: { max: 120 } }),
    ])
    expect(firstProblems(schema, { name: 'Counterpoint I' })).toEqual([])
  })
})
