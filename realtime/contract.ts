import type { IncomingMessage, Server } from 'node:http'
import type { Kysely } from 'kysely'
import type { Logger } from 'pino'
import type { Database } from '@/db/schema'
import type { LessonRole } from '@/shared/api/lessons'

/** Who a connection speaks for in one lesson. The server stamps it; nothing a client says of itself is believed. */
export type LessonIdentity = Readonly<{
  lessonId: string
  /** Null for a wall, which is nobody. */
  memberId: string | null
  role: LessonRole
  name: string
  /** Of the login or wall session, so that ending it ends the connection. */
  sessionId: string
}>

export type IdentityRefusal =
  'signed-out' | 'forbidden' | 'not-found' | 'lesson-ended' | 'removed' | 'lesson-full'

/** Given by the server: reads the cookie of an upgrade request afresh (no cache) and says who it is in that lesson. */
export type IdentifyConnection = (
  request: IncomingMessage,
  lessonId: string,
) => Promise<Readonly<{ ok: true; identity: LessonIdentity } | { ok: false; refusal: IdentityRefusal }>>

export type RealtimeOptions = Readonly<{
  httpServer: Server
  db: Kysely<Database>
  identify: IdentifyConnection
  /** Origins from which an upgrade is taken, such as `http://localhost:8080`. */
  allowedOrigins: readonly string[]
  log: Logger
  /** The clock; the machine's unless a test brings its own. */
  nowMs?: () => number
  /** How long a lesson stays in memory after the last one left. */
  graceMs?: number
}>

/** What the routes may ask of the live rooms after they changed something in the database. */
export type Realtime = Readonly<{
  /** A lesson was ended or removed: says so to everyone in it and closes its rooms. */
  lessonEnded: (lessonId: string) => Promise<void>
  /** Door, title or code changed: everyone in the lesson asks again. */
  lessonChanged: (lessonId: string) => void
  /** Somebody new entered: told to those who lead, and gathered, for a class enters within seconds. */
  rosterChanged: (lessonId: string) => void
  /** A member's role or standing changed: its connections are identified again. */
  memberChanged: (lessonId: string, memberId: string) => Promise<void>
  /** A login or wall session ended. */
  sessionEnded: (sessionId: string) => void
  close: () => Promise<void>
}>
