import type { z } from 'zod'

export type Method = 'GET' | 'POST' | 'PATCH' | 'DELETE'

/** One request of the API: where it goes, what it takes, what it answers. Server and client are both made from it. */
export type Endpoint<
  Path extends string = string,
  Query extends z.ZodType = z.ZodType,
  Body extends z.ZodType = z.ZodType,
  Reply extends z.ZodType = z.ZodType,
> = Readonly<{ method: Method; path: Path; query?: Query; body?: Body; reply: Reply }>

/** Names of the `:placeholders` in a path. */
export type PathParams<Path extends string> = Path extends `${string}:${infer Name}/${infer Rest}`
  ? Name | PathParams<Rest>
  : Path extends `${string}:${infer Name}`
    ? Name
    : never

/** Keeps the literal types of an endpoint. */
export const endpoint = <
  Path extends string,
  Reply extends z.ZodType,
  Query extends z.ZodType = z.ZodUndefined,
  Body extends z.ZodType = z.ZodUndefined,
>(
  value: Endpoint<Path, Query, Body, Reply>,
): Endpoint<Path, Query, Body, Reply> => value
