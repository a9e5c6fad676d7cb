import type { APIRequestContext } from 'playwright-core'
import type { z } from 'zod'
import type { Endpoint, PathParams } from '@/shared/api/endpoint'

type Given<Path extends string, Body> = Readonly<{ params?: Record<PathParams<Path>, string>; body?: Body }>

/** Makes a request of the API as whoever a browser context is, and gives its parsed answer; throws on a refusal. */
export async function ask<
  Path extends string,
  Query extends z.ZodType,
  Body extends z.ZodType,
  Reply extends z.ZodType,
>(
  request: APIRequestContext,
  origin: string,
  endpoint: Endpoint<Path, Query, Body, Reply>,
  { params, body }: Given<Path, z.input<Body>> = {},
): Promise<z.output<Reply>> {
  const given: Readonly<Record<string, string>> = params ?? {}
  const path = endpoint.path.replace(/:(\w+)/g, (_, name: string) =>
    encodeURIComponent(given[name] as string),
  )
  const response = await request.fetch(origin + path, {
    method: endpoint.method,
    headers: { origin },
    ...(body === undefined ? {} : { data: body }),
  })
  if (!response.ok()) {
    throw new Error(`${endpoint.method} ${path} was refused (${response.status()}): ${await response.text()}`)
  }
  return endpoint.reply.parse(await response.json())
}
