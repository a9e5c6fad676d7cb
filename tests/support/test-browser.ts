import type { z } from 'zod'
import type { Endpoint } from '@/shared/api/endpoint'
import type { ApiErrorBody } from '@/shared/api/errors'

export type Answer<Body = unknown> = Readonly<{ status: number; headers: Headers; body: Body; text: string }>

type Loose = Readonly<{
  params?: Readonly<Record<string, string>>
  query?: Readonly<Record<string, string>>
  body?: unknown
}>

/** What a page in a browser does: keeps cookies and names its origin. */
export type TestBrowser = ReturnType<typeof createBrowser>

export function createBrowser(url: string, origin = url) {
  const cookies = new Map<string, string>()

  async function request(
    method: string,
    path: string,
    { body, headers = {} }: Readonly<{ body?: unknown; headers?: Readonly<Record<string, string>> }> = {},
  ): Promise<Answer> {
    const isRaw = typeof body === 'string' || body instanceof Uint8Array
    const response = await fetch(url + path, {
      method,
      redirect: 'manual',
      headers: {
        origin,
        ...(body !== undefined && { 'content-type': 'application/json' }),
        ...(cookies.size > 0 && {
          cookie: [...cookies].map(([name, value]) => `${name}=${value}`).join('; '),
        }),
        ...headers,
      },
      ...(body !== undefined && { body: (isRaw ? body : JSON.stringify(body)) as BodyInit }),
    })
    for (const cookie of response.headers.getSetCookie()) {
      const [pair = '', ...attributes] = cookie.split(';')
      const [name = '', value = ''] = pair.split(/=(.*)/s)
      const isGone = value === '' || attributes.some((attribute) => /^\s*max-age=0$/i.test(attribute))
      if (isGone) cookies.delete(name)
      else cookies.set(name, value)
    }
    const text = await response.text()
    let parsed: unknown = null
    try {
      parsed = JSON.parse(text)
    } catch {
      // No JSON; the text tells.
    }
    return { status: response.status, headers: response.headers, body: parsed, text }
  }

  /** Asks by the endpoint table, leaving out nothing of what came back. */
  const ask = (
    // eslint-disable-next-line @typescript-eslint/no-explicit-any -- any endpoint of the table
    endpoint: Endpoint<string, any, any, any>,
    { params = {}, query = {}, body }: Loose = {},
  ): Promise<Answer> => {
    const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params[name] ?? ''))
    const search = new URLSearchParams(query).toString()
    return request(endpoint.method, search ? `${path}?${search}` : path, { body })
  }

  /** Asks and expects to be answered. */
  async function get<
    Path extends string,
    Query extends z.ZodType,
    Body extends z.ZodType,
    Reply extends z.ZodType,
  >(endpoint: Endpoint<Path, Query, Body, Reply>, input: Loose = {}): Promise<z.output<Reply>> {
    const { status, text, body } = await ask(endpoint, input)
    if (status !== 200) throw new Error(`${endpoint.method} ${endpoint.path}: ${status} ${text}`)
    return endpoint.reply.parse(body)
  }

  return {
    cookies,
    request,
    ask,
    get,
    auth: (path: string, body?: unknown) =>
      request(body === undefined ? 'GET' : 'POST', `/api/auth${path}`, { body }),
    signIn: (email: string, password: string) =>
      request('POST', '/api/auth/sign-in/email', { body: { email, password } }),
  }
}

export const errorOf = (answer: Answer): ApiErrorBody['error'] => {
  const error = (answer.body as Partial<ApiErrorBody> | null)?.error
  if (!error) throw new Error(`No refusal: ${answer.status} ${answer.text}`)
  return error
}
