import type { IncomingMessage } from 'node:http'
import type { Duplex } from 'node:stream'
import type { Logger } from 'pino'
import { WebSocketServer, type WebSocket } from 'ws'
import type { IdentifyConnection, LessonIdentity } from '@/realtime/contract'
import type { LiveDocument } from '@/realtime/document/live-document'
import type { Room } from '@/realtime/room/room'
import type { Rooms } from '@/realtime/room/rooms'
import { CHANNEL_PATH, CLOSE, DOCUMENT_PATH, WIRE_LIMITS } from '@/shared/wire/rooms'
import { DocumentConnection, type Closing } from './document-connection'
import { KEEP_ALIVE, parseFrame } from './frames'
import { CLOSING_OF } from './refusals'
import { accessTo, parseRoomTarget, type RoomTarget } from './room-target'

/** y-websocket leaves after thirty silent seconds. */
const KEEP_ALIVE_MS = 20_000

export type DocumentServerOptions = Readonly<{
  rooms: Rooms
  identify: IdentifyConnection
  isAllowedOrigin: (origin: string | undefined) => boolean
  /** Whether somebody who leads may read the sheet of this member. */
  isMember: (lessonId: string, memberId: string) => Promise<boolean>
  nowMs: () => number
  log: Logger
}>

type Admitted = Readonly<{ identity: LessonIdentity; access: 'read' | 'write' }>

/** Takes the upgrades under `DOCUMENT_PATH` and speaks y-websocket's protocol on them. */
export class DocumentServer {
  readonly #options: DocumentServerOptions
  readonly #sockets = new WebSocketServer({
    noServer: true,
    maxPayload: WIRE_LIMITS.frameBytes,
    perMessageDeflate: false,
    clientTracking: false,
  })
  readonly #heart: NodeJS.Timeout

  constructor(options: DocumentServerOptions) {
    this.#options = options
    this.#heart = setInterval(() => this.#keepAlive(), KEEP_ALIVE_MS)
    this.#heart.unref()
  }

  /** Handler of the HTTP server's `upgrade`; upgrades of the class channel are left to it. */
  readonly onUpgrade = (request: IncomingMessage, socket: Duplex, head: Buffer): void => {
    const url = request.url ?? '/'
    if (isUnder(url, CHANNEL_PATH)) return
    // Without a listener a socket that breaks while we look up who it is would end the process.
    socket.on('error', () => socket.destroy())
    if (!isUnder(url, DOCUMENT_PATH)) return answer(socket, '404 Not Found')
    if (!this.#options.isAllowedOrigin(request.headers.origin)) return answer(socket, '403 Forbidden')
    const target = parseRoomTarget(url)
    if (!target) return this.#turnAway(request, socket, head, CLOSE.badRequest)
    this.#admit(request, socket, head, target).catch((error: unknown) => {
      this.#options.log.error({ err: error, lessonId: target.lessonId }, 'a live connection was not opened')
      // Comes back by itself.
      answer(socket, '503 Service Unavailable')
    })
  }

  async #admit(request: IncomingMessage, socket: Duplex, head: Buffer, target: RoomTarget): Promise<void> {
    const admitted = await this.#identify(request, target)
    if ('code' in admitted) return this.#turnAway(request, socket, head, admitted)
    const { rooms } = this.#options
    const room = await rooms.enter(target.lessonId)
    if (!room) return this.#turnAway(request, socket, head, CLOSE.notFound)
    const live = documentOf(room, target)
    const isFull = !live || !room.mayConnect(admitted.identity, live)
    if (isFull || socket.destroyed) {
      rooms.leave(target.lessonId)
      return isFull ? this.#turnAway(request, socket, head, CLOSE.full) : undefined
    }
    let isOpened = false
    socket.once('close', () => {
      // The upgrade itself was refused: its key or version was wrong.
      if (!isOpened) rooms.leave(target.lessonId)
    })
    this.#sockets.handleUpgrade(request, socket, head, (opened) => {
      isOpened = true
      this.#open(opened, room, live, admitted)
    })
  }

  async #identify(request: IncomingMessage, target: RoomTarget): Promise<Admitted | Closing> {
    const found = await this.#options.identify(request, target.lessonId)
    if (!found.ok) return CLOSING_OF[found.refusal]
    const access = accessTo(target, found.identity)
    if (!access) return CLOSE.forbidden
    const { memberId } = target
    const isOwn = memberId === found.identity.memberId
    if (memberId !== null && !isOwn && !(await this.#options.isMember(target.lessonId, memberId))) {
      return CLOSE.notFound
    }
    return { identity: found.identity, access }
  }

  #open(socket: WebSocket, room: Room, live: LiveDocument, { identity, access }: Admitted): void {
    const { nowMs, rooms } = this.#options
    const canWrite = access === 'write' && !room.isEnded
    const connection = new DocumentConnection(socket, identity, live, canWrite, nowMs())
    socket.binaryType = 'nodebuffer'
    socket.on('error', () => socket.terminate())
    socket.on('pong', () => (connection.isAlive = true))
    socket.on('close', () => {
      room.disconnect(connection)
      rooms.leave(room.lessonId)
    })
    socket.on('message', (data: Buffer, isBinary) => {
      if (socket.readyState !== socket.OPEN) return
      if (!connection.mayHear(nowMs())) return connection.close(CLOSE.tooFast)
      const frame = isBinary ? parseFrame(data) : null
      if (!frame?.ok) return connection.close(CLOSE.malformed)
      room.receive(connection, frame.value)
    })
    room.connect(connection)
  }

  /** Opens the connection to close it with a code: to a plain HTTP refusal y-websocket would come back for ever. */
  #turnAway(request: IncomingMessage, socket: Duplex, head: Buffer, { code, reason }: Closing): void {
    if (socket.destroyed) return
    this.#sockets.handleUpgrade(request, socket, head, (opened) => {
      opened.on('error', () => opened.terminate())
      opened.close(code, reason)
    })
  }

  #keepAlive(): void {
    for (const room of this.#options.rooms.all()) {
      for (const connection of room.connections) {
        if (!connection.isAlive) {
          connection.terminate()
          continue
        }
        connection.isAlive = false
        connection.ping()
        connection.send(KEEP_ALIVE)
      }
    }
  }

  close(): void {
    clearInterval(this.#heart)
    this.#sockets.close()
  }
}

const isUnder = (url: string, path: string): boolean =>
  url === path || url.startsWith(`${path}/`) || url.startsWith(`${path}?`)

function documentOf(room: Room, { kind, memberId }: RoomTarget): LiveDocument | null {
  if (kind === 'board') return room.board
  return kind === 'chorus' ? room.chorus : room.sheetOf(memberId as string)
}

function answer(socket: Duplex, status: string): void {
  socket.end(`HTTP/1.1 ${status}\r\nConnection: close\r\nContent-Length: 0\r\n\r\n`)
}
