import type { Request, Response } from 'express'
import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import type { Realtime } from '@/realtime/contract'
import { findAsker, type Asker } from '@/server/auth/asker'
import type { Auth } from '@/server/auth/create-auth'
import type { Config } from '@/server/config'
import type { Limits } from '@/server/limits/create-limits'
import type { FakeMailProvider } from '@/server/mail/fake-mail-provider'
import type { Mailer } from '@/server/mail/mailer'
import type { DemoPeople } from '@/db/demo/people'

/** What the routes work with, handed down from the entry point. */
export type Context = Readonly<{
  config: Config
  secret: string
  db: Connection
  auth: Auth
  limits: Limits
  mailer: Mailer
  log: Logger
  /** The live rooms. They are attached after the routes are made. */
  realtime: () => Realtime
  /** The demo's open mail and people; null outside the demo. */
  demo: Readonly<{ mail: FakeMailProvider; people: DemoPeople }> | null
}>

export const askerOf = (
  { auth, db }: Context,
  { request, response }: Readonly<{ request: Request; response: Response }>,
): Promise<Asker> => findAsker({ auth, db }, request.headers, response)
