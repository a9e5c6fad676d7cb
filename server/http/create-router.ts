import { Router, type Request, type Response } from 'express'
import { z } from 'zod'
import type { Endpoint, PathParams } from '@/shared/api/endpoint'
import { idSchema } from '@/shared/api/fields'
import type { FieldProblem } from '@/shared/api/errors'
import { fieldProblems, MAX_PROBLEMS_TOLD } from '@/shared/api/field-problems'
import { Refused } from '@/server/errors/refused'

/** A request that has been parsed: what the path, the query and the body said, and the raw request for its cookies. */
export type Asked<Path extends string, Query, Body> = Readonly<{
  params: Readonly<Record<PathParams<Path>, string>>
  query: Query
  body: Body
  request: Request
  response: Response
}>

type Handler<
  Path extends string,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Reply extends z.ZodType,
> = (asked: Asked<Path, z.output<Query>, z.output<Body>>) => Promise<z.input<Reply>>

/** Placeholders that are no ids: their handlers judge them. */
const FREE_PARAMS = new Set(['token', 'code'])
const MAX_PARAM_CHARACTERS = 200

function parseParams<Path extends string>(params: Request['params']): Record<PathParams<Path>, string> {
  for (const [name, value] of Object.entries(params)) {
    const isGood =
      typeof value === 'string' &&
      (FREE_PARAMS.has(name) ? value.length <= MAX_PARAM_CHARACTERS : idSchema.safeParse(value).success)
    // What cannot be an id is the id of nothing.
    if (!isGood) throw new Refused('not-found')
  }
  return params as Record<PathParams<Path>, string>
}

/** A NUL, or half of a character: no text, and nothing the database can keep. */
// eslint-disable-next-line no-control-regex -- this is the character to refuse
const UNKEEPABLE = /[\u0000\ud800-\udfff]/u

function unkeepableProblems(value: unknown, path: readonly string[] = []): readonly FieldProblem[] {
  if (typeof value === 'string') {
    return UNKEEPABLE.test(value) ? [{ path: path.join('.'), code: 'hidden-characters' }] : []
  }
  if (typeof value !== 'object' || value === null) return []
  return Object.entries(value).flatMap(([key, part]) => [
    ...(UNKEEPABLE.test(key) ? [{ path: path.join('.'), code: 'hidden-characters' }] : []),
    ...unkeepableProblems(part, [...path, key]),
  ])
}

function parsePart<Schema extends z.ZodType>(schema: Schema | undefined, value: unknown): z.output<Schema> {
  const parsed = (schema ?? z.strictObject({})).safeParse(value)
  if (!parsed.success) throw new Refused('invalid', { fields: fieldProblems(parsed.error) })
  // Looked for in what was parsed: its depth and size are bounded by then.
  const fields = unkeepableProblems(parsed.data).slice(0, MAX_PROBLEMS_TOLD)
  if (fields.length > 0) throw new Refused('invalid', { fields })
  return parsed.data as z.output<Schema>
}

/** Collects the routes of one resource from the endpoint table. */
export function createRouter() {
  const router = Router()
  /** Registers an endpoint: its request is parsed strictly before `handle` sees it, its reply before it leaves. */
  const on = <Path extends string, Query extends z.ZodType, Body extends z.ZodType, Reply extends z.ZodType>(
    endpoint: Endpoint<Path, Query, Body, Reply>,
    handle: Handler<Path, Query, Body, Reply>,
  ): void => {
    const verb = endpoint.method.toLowerCase() as 'get' | 'post' | 'patch' | 'delete'
    router[verb](endpoint.path, async (request, response) => {
      response.locals.route = endpoint.path
      const params = parseParams<Path>(request.params)
      const query = parsePart(endpoint.query, request.query)
      const body = parsePart(endpoint.body, request.body ?? {})
      const reply = await handle({ params, query, body, request, response })
      // An answer says what the table says and nothing beside it: a column too many fails here, not at a reader.
      response.setHeader('Cache-Control', 'no-store')
      response.json(endpoint.reply.parse(reply))
    })
  }
  return { router, on }
}
