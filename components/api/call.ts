import type { z } from 'zod'
import { fail, ok, type Result } from '@/shared/result'
import type { Endpoint, PathParams } from '@/shared/api/endpoint'
import { API_ERRORS, type ApiErrorBody, type ApiErrorCode, type FieldProblem } from '@/shared/api/errors'

/** Why a request did not do what was asked: the server's codes, and the two that never reach a server. */
export type Refusal = Readonly<{
  code: ApiErrorCode | 'offline' | 'bad-reply'
  fields: readonly FieldProblem[]
  retryAfterSeconds: number | null
}>

export const refusalOf = (code: Refusal['code'], more: Partial<Refusal> = {}): Refusal => ({
  code,
  fields: [],
  retryAfterSeconds: null,
  ...more,
})

// eslint-disable-next-line @typescript-eslint/no-explicit-any -- any endpoint of the table
export type AnyEndpoint = Endpoint<string, any, any, any>

type ParamsOf<E> = E extends Endpoint<infer Path, z.ZodType, z.ZodType, z.ZodType> ? PathParams<Path> : never
type Sent<Schema> = Schema extends z.ZodUndefined ? never : Schema extends z.ZodType ? z.input<Schema> : never

/** What a request needs beside its endpoint: values for its `:placeholders`, its query, its body. */
export type InputOf<E extends AnyEndpoint> = Readonly<
  ([ParamsOf<E>] extends [never] ? object : { params: Record<ParamsOf<E>, string> }) &
    ([Sent<NonNullable<E['query']>>] extends [never] ? object : { query?: Sent<NonNullable<E['query']>> }) &
    ([Sent<NonNullable<E['body']>>] extends [never] ? object : { body: Sent<NonNullable<E['body']>> })
>
export type ReplyOf<E extends AnyEndpoint> = z.output<E['reply']>

type Loose = Readonly<{
  params?: Readonly<Record<string, string>>
  query?: Readonly<Record<string, unknown>>
  body?: unknown
}>

/** `urlOf('/api/courses/:courseId', { params: { courseId: 'a b' } })` is `/api/courses/a%20b`. */
export function urlOf(path: string, { params = {}, query = {} }: Loose): string {
  const filled = path.replace(/:(\w+)/g, (_, name: string) => encodeURIComponent(params[name] ?? ''))
  const search = new URLSearchParams()
  for (const [key, value] of Object.entries(query)) {
    if (value !== undefined && value !== '') search.set(key, String(value))
  }
  const text = search.toString()
  return text ? `${filled}?${text}` : filled
}

/** Reads the body of a refusal; a body that is none of ours (a proxy's page) becomes the code its status suggests. */
export function readRefusal(status: number, body: unknown): Refusal {
  const error = (body as Partial<ApiErrorBody> | null)?.error
  if (error && typeof error.code === 'string' && error.code in API_ERRORS) {
    return refusalOf(error.code, {
      fields: error.fields ?? [],
      retryAfterSeconds: error.retryAfterSeconds ?? null,
    })
  }
  if (status === 429) return refusalOf('too-many-tries')
  if (status === 502 || status === 503 || status === 504) return refusalOf('unavailable')
  return refusalOf(status >= 500 ? 'internal' : 'bad-reply')
}

export type CallOptions = Readonly<{ signal?: AbortSignal }>
export type Call = <E extends AnyEndpoint>(
  endpoint: E,
  input: InputOf<E>,
  options?: CallOptions,
) => Promise<Result<ReplyOf<E>, Refusal>>

/** Makes the client of the endpoint table. An expected failure is a value; only an abort throws. */
export function createApiClient(send: typeof fetch = (...args) => fetch(...args)): Call {
  return async (endpoint, input, options = {}) => {
    const { params, query, body } = input as Loose
    let response: Response
    let answer: unknown
    try {
      response = await send(urlOf(endpoint.path, { params, query }), {
        method: endpoint.method,
        credentials: 'same-origin',
        signal: options.signal,
        headers: body === undefined ? undefined : { 'content-type': 'application/json' },
        body: body === undefined ? undefined : JSON.stringify(body),
      })
      answer = await response.json().catch(() => null)
    } catch (error) {
      if (options.signal?.aborted) throw error
      return fail(refusalOf('offline'))
    }
    if (!response.ok) return fail(readRefusal(response.status, answer))
    if (answer === null || typeof answer !== 'object') return fail(refusalOf('bad-reply'))
    return ok(answer as ReplyOf<typeof endpoint>)
  }
}

/** The page's own client. */
export const callApi: Call = createApiClient()
