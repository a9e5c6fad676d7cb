import type { Server as HttpServer } from 'node:http'
import type { Logger } from 'pino'
import { Server, type Socket } from 'socket.io'
import { RateBucket } from '@/realtime/connection/rate-bucket'
import type { IdentifyConnection, LessonIdentity } from '@/realtime/contract'
import type { Trouble } from '@/realtime/journal/database-trouble'
import type { Rooms } from '@/realtime/room/rooms'
import { can } from '@/shared/board'
import {
  CHANNEL_PATH,
  CHANNEL_REQUESTS,
  channelAuthSchema,
  WIRE_LIMITS,
  type ChannelEvents,
  type ChannelReply,
  type ChannelRequest,
} from '@/shared/wire/rooms'
import { Presence } from './presence'
import { answerRequest, type RequestOutcome } from './requests'

/** Arrivals and hands are told together: a class of five hundred comes in within seconds. */
const PRESENCE_MS = 250
/** A socket that has not said who it is by then is let go. */
const CONNECT_TIMEOUT_MS = 10_000

type Reply = (reply: ChannelReply) => void
type ClientEvents = { [Name in ChannelRequest]: (payload: unknown, reply: Reply) => void }
type SocketData = { identity: LessonIdentity }
export type ChannelSocket = Socket<ClientEvents, ChannelEvents, Record<string, never>, SocketData>

/** Groups of sockets that hear the same. */
const GROUP = {
  lesson: (lessonId: string) => `lesson:${lessonId}`,
  pupils: (lessonId: string) => `pupils:${lessonId}`,
  leaders: (lessonId: string) => `leaders:${lessonId}`,
  wall: (lessonId: string) => `wall:${lessonId}`,
  member: (lessonId: string, memberId: string) => `member:${lessonId}:${memberId}`,
  session: (sessionId: string) => `session:${sessionId}`,
} as const

export type ClassChannelOptions = Readonly<{
  httpServer: HttpServer
  rooms: () => Rooms
  identify: IdentifyConnection
  isAllowedOrigin: (origin: string | undefined) => boolean
  /** Sends a pupil out for good; false when there is no such pupil in the lesson. */
  removeMember: (lessonId: string, memberId: string) => Promise<boolean>
  nowMs: () => number
  log: Logger
}>

/** What is not score: presence, hands, cues, "kept". On socket.io, beside the documents. */
export class ClassChannel {
  readonly #options: ClassChannelOptions
  readonly #io: Server<ClientEvents, ChannelEvents, Record<string, never>, SocketData>
  readonly #presence = new Map<string, Presence>()
  readonly #toTell = new Map<string, NodeJS.Timeout>()
  readonly #rosters = new Map<string, NodeJS.Timeout>()

  constructor(options: ClassChannelOptions) {
    this.#options = options
    this.#io = new Server(options.httpServer, {
      path: CHANNEL_PATH,
      serveClient: false,
      transports: ['websocket'],
      destroyUpgrade: false,
      maxHttpBufferSize: WIRE_LIMITS.channelBytes,
      connectTimeout: CONNECT_TIMEOUT_MS,
      allowRequest: (request, done) => done(null, options.isAllowedOrigin(request.headers.origin)),
    })
    this.#io.use((socket, next) => {
      this.#identify(socket).then(
        (refusal) => next(refusal === null ? undefined : new Error(refusal)),
        (error: unknown) => {
          options.log.error({ err: error }, 'the class channel could not say who it is')
          next(new Error('unavailable'))
        },
      )
    })
    this.#io.on('connection', (socket) => this.#welcome(socket))
  }

  /** Puts the identity on the socket, or gives the reason for letting nobody in. */
  async #identify(socket: ChannelSocket): Promise<string | null> {
    const auth = channelAuthSchema.safeParse(socket.handshake.auth)
    if (!auth.success) return 'bad-request'
    const { lessonId } = auth.data
    const found = await this.#options.identify(socket.request, lessonId)
    if (!found.ok) return found.refusal
    const { memberId, sessionId } = found.identity
    const group = memberId === null ? GROUP.session(sessionId) : GROUP.member(lessonId, memberId)
    const others = this.#io.sockets.adapter.rooms.get(group)
    if (others && others.size >= WIRE_LIMITS.connectionsAMember) return 'lesson-full'
    socket.data.identity = found.identity
    return null
  }

  #welcome(socket: ChannelSocket): void {
    const { identity } = socket.data
    const { lessonId, memberId, role, sessionId } = identity
    // The request with its headers has done its work, and would stay in memory as long as the socket.
    Object.assign(socket.conn, { request: null })
    const lead = can(role, 'see names')
    void socket.join([
      GROUP.lesson(lessonId),
      GROUP.session(sessionId),
      lead ? GROUP.leaders(lessonId) : role === 'wall' ? GROUP.wall(lessonId) : GROUP.pupils(lessonId),
      ...(memberId === null ? [] : [GROUP.member(lessonId, memberId)]),
    ])
    const presence = this.presenceOf(lessonId)
    presence.arrive(identity)
    // A screen that comes back may have missed that its hand was lowered.
    if (memberId !== null && can(role, 'raise hand'))
      socket.emit('ownHand', { up: presence.isHandUp(memberId) })
    this.tellPresence(lessonId)
    this.#listen(socket)
    const entering = this.#enterRoom(socket)
    socket.on('disconnect', () => {
      const presence = this.#presence.get(lessonId)
      presence?.depart(identity)
      if (presence?.isEmpty) this.#presence.delete(lessonId)
      this.tellPresence(lessonId)
      void entering.then((isIn) => isIn && this.#options.rooms().leave(lessonId))
    })
  }

  /** Holds the lesson's room while the socket is there, and tells it how keeping stands. Whether it got in. */
  async #enterRoom(socket: ChannelSocket): Promise<boolean> {
    const { identity } = socket.data
    try {
      const room = await this.#options.rooms().enter(identity.lessonId)
      if (!room) return false
      if (room.trouble) socket.emit('keeping', keepingOf(room.trouble))
      room.acknowledgeAll(identity)
      return true
    } catch (error) {
      this.#options.log.error({ err: error, lessonId: identity.lessonId }, 'a lesson was not opened')
      // Without "being closed by the server" the client comes back by itself.
      socket.conn.close()
      return false
    }
  }

  #listen(socket: ChannelSocket): void {
    const bucket = new RateBucket(WIRE_LIMITS.channelMessagesASecond, this.#options.nowMs())
    socket.use((_, next) => {
      if (bucket.take(this.#options.nowMs())) next()
      else socket.disconnect(true)
    })
    for (const name of Object.keys(CHANNEL_REQUESTS) as ChannelRequest[]) {
      socket.on(name, (...args: unknown[]) => {
        const reply = args.find((arg) => typeof arg === 'function') as Reply | undefined
        this.#answer(socket.data.identity, name, args[0]).then(
          (answer) => reply?.(answer),
          (error: unknown) => {
            this.#options.log.error({ err: error, name }, 'a channel request failed')
            reply?.({ ok: false, error: 'internal' })
          },
        )
      })
    }
  }

  async #answer(identity: LessonIdentity, name: ChannelRequest, payload: unknown): Promise<ChannelReply> {
    const { lessonId } = identity
    const outcome: RequestOutcome = answerRequest(identity, this.presenceOf(lessonId), name, payload)
    switch (outcome.kind) {
      case 'refused':
        return { ok: false, error: outcome.error }
      case 'hand':
        this.#io.to(GROUP.member(lessonId, outcome.memberId)).emit('ownHand', { up: outcome.isUp })
        this.tellPresence(lessonId)
        return { ok: true }
      case 'cue':
        this.#io.to(GROUP.wall(lessonId)).emit('cue', outcome.cue)
        return { ok: true }
      case 'remove': {
        const isDone = await this.#options.removeMember(lessonId, outcome.memberId)
        return isDone ? { ok: true } : { ok: false, error: 'not-found' }
      }
      case 'done':
        return { ok: true }
    }
  }

  presenceOf(lessonId: string): Presence {
    const known = this.#presence.get(lessonId)
    if (known) return known
    const made = new Presence()
    this.#presence.set(lessonId, made)
    return made
  }

  /** Tells everyone who is here, soon: names to those who lead, and to the wall only while the stage shows them. */
  tellPresence(lessonId: string): void {
    if (this.#toTell.has(lessonId)) return
    const timer = setTimeout(() => {
      this.#toTell.delete(lessonId)
      const presence = this.#presence.get(lessonId)
      const counts = presence?.counts() ?? { here: 0, hands: 0 }
      const named = { ...counts, members: presence?.members() ?? [] }
      const showsNames = this.#options.rooms().peek(lessonId)?.boardState?.stage.showsNames === true
      this.#io.to(GROUP.pupils(lessonId)).emit('presence', counts)
      this.#io.to(GROUP.leaders(lessonId)).emit('presence', named)
      this.#io.to(GROUP.wall(lessonId)).emit('presence', showsNames ? named : counts)
    }, PRESENCE_MS)
    timer.unref()
    this.#toTell.set(lessonId, timer)
  }

  kept(lessonId: string, memberId: string, room: string, clocks: Readonly<Record<string, number>>): void {
    this.#io.to(GROUP.member(lessonId, memberId)).emit('kept', { room, clocks })
  }

  keeping(lessonId: string, trouble: Trouble | null): void {
    this.#io.to(GROUP.lesson(lessonId)).emit('keeping', trouble === null ? { ok: true } : keepingOf(trouble))
  }

  /** Tells everybody in a lesson that it changed. */
  tellLesson(lessonId: string, kind: Parameters<ChannelEvents['lesson']>[0]['kind']): void {
    this.#io.to(GROUP.lesson(lessonId)).emit('lesson', { kind })
  }

  /** Tells those who lead, soon, that there are other members. */
  tellRoster(lessonId: string): void {
    if (this.#rosters.has(lessonId)) return
    const timer = setTimeout(() => {
      this.#rosters.delete(lessonId)
      this.#io.to(GROUP.leaders(lessonId)).emit('lesson', { kind: 'roster' })
    }, PRESENCE_MS)
    timer.unref()
    this.#rosters.set(lessonId, timer)
  }

  tellMember(lessonId: string, memberId: string, kind: Parameters<ChannelEvents['lesson']>[0]['kind']): void {
    this.#io.to(GROUP.member(lessonId, memberId)).emit('lesson', { kind })
  }

  /** Ends a member's sockets; they come back to be identified again. */
  endMember(lessonId: string, memberId: string): void {
    this.#io.in(GROUP.member(lessonId, memberId)).disconnectSockets(true)
  }

  endLesson(lessonId: string): void {
    this.#io.in(GROUP.lesson(lessonId)).disconnectSockets(true)
  }

  endSession(sessionId: string): void {
    this.#io.in(GROUP.session(sessionId)).disconnectSockets(true)
  }

  /** Lets go of every socket; the HTTP server is its owner's to close. */
  close(): void {
    for (const timer of [...this.#toTell.values(), ...this.#rosters.values()]) clearTimeout(timer)
    this.#io.disconnectSockets(true)
    this.#io.engine.close()
  }
}

const keepingOf = (trouble: Trouble) =>
  ({ ok: false, because: trouble === 'disk-full' ? 'disk-full' : 'database' }) as const
