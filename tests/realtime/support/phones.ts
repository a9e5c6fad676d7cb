import { createId } from '@/db/create-id'
import { DOCUMENT_PATH, CHANNEL_PATH, roomOf, type ChannelEvents } from '@/shared/wire/rooms'
import { io, type Socket } from 'socket.io-client'
import { WebSocket as NodeWebSocket } from 'ws'
import { WebsocketProvider } from 'y-websocket'
import * as Y from 'yjs'
import { formatCookie, type TestCookie } from './cookies'
import type { TestMember } from './lesson'
import { until } from './until'

/** A socket class that carries a cookie and an origin, as a browser's does by itself. */
export function socketClass(origin: string, cookie: TestCookie | null): typeof WebSocket {
  const headers = { origin, ...(cookie && { cookie: formatCookie(cookie) }) }
  return class extends NodeWebSocket {
    constructor(url: string, protocols?: string[]) {
      super(url, protocols, { headers })
    }
  } as unknown as typeof WebSocket
}

export type OpenDocument = Readonly<{
  doc: Y.Doc
  provider: WebsocketProvider
  /** Code of a close that the client does not come back from. */
  closedCode: () => number | null
  close: () => void
}>

/** Opens a document with y-websocket's own client. */
export function openDocument(
  origin: string,
  room: string,
  cookie: TestCookie | null,
  doc = new Y.Doc(),
): OpenDocument {
  const provider = new WebsocketProvider(origin.replace('http', 'ws') + DOCUMENT_PATH, room, doc, {
    WebSocketPolyfill: socketClass(origin, cookie),
    disableBc: true,
    maxBackoffTime: 200,
  })
  provider.awareness.setLocalState(null)
  let code: number | null = null
  provider.on('closed', (event) => (code = event.code))
  return {
    doc,
    provider,
    closedCode: () => code,
    close: () => {
      provider.destroy()
      provider.awareness.destroy()
    },
  }
}

export const whenSynced = ({ provider }: OpenDocument): Promise<void> => until(() => provider.synced)

export type Channel = Socket<ChannelEvents, Record<string, (...args: unknown[]) => void>>

export function openChannel(origin: string, lessonId: string, cookie: TestCookie | null): Channel {
  return io(origin, {
    path: CHANNEL_PATH,
    transports: ['websocket'],
    auth: { lessonId },
    extraHeaders: { origin, ...(cookie && { cookie: formatCookie(cookie) }) },
    reconnectionDelay: 50,
    reconnectionDelayMax: 200,
    forceNew: true,
  })
}

/** A phone with its board, its sheet and its channel, and the clocks it was told are kept. */
export class Phone {
  readonly member: TestMember
  readonly cookie: TestCookie
  readonly board: OpenDocument
  readonly sheet: OpenDocument
  readonly channel: Channel
  readonly #sheetRoom: string
  /** Sheet clocks the server has acknowledged, by Yjs client id. */
  readonly kept = new Map<number, number>()

  constructor(origin: string, member: TestMember, sheet = new Y.Doc()) {
    const { lessonId, memberId } = member
    this.member = member
    this.cookie = { sessionId: createId(), memberId }
    this.#sheetRoom = roomOf.sheet(lessonId, memberId)
    this.board = openDocument(origin, roomOf.board(lessonId), this.cookie)
    this.sheet = openDocument(origin, this.#sheetRoom, this.cookie, sheet)
    this.channel = openChannel(origin, lessonId, this.cookie)
    this.channel.on('kept', ({ room, clocks }) => {
      if (room !== this.#sheetRoom) return
      for (const [client, clock] of Object.entries(clocks)) {
        this.kept.set(Number(client), Math.max(clock, this.kept.get(Number(client)) ?? 0))
      }
    })
  }

  get isReady(): boolean {
    return this.board.provider.synced && this.sheet.provider.synced && this.channel.connected
  }

  /** Whether everything written on this sheet is acknowledged. */
  get isKept(): boolean {
    const { doc } = this.sheet
    return [...Y.decodeStateVector(Y.encodeStateVector(doc))].every(
      ([client, clock]) => (this.kept.get(client) ?? 0) >= clock,
    )
  }

  goOffline(): void {
    this.board.provider.disconnect()
    this.sheet.provider.disconnect()
    this.channel.disconnect()
  }

  comeBack(): void {
    this.board.provider.connect()
    this.sheet.provider.connect()
    this.channel.connect()
  }

  close(): void {
    this.board.close()
    this.sheet.close()
    this.channel.close()
  }
}
