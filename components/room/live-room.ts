/** The live lesson of one screen. Loaded with the lesson's routes only, for it brings yjs and socket.io with it. */
import { io, type Socket } from 'socket.io-client'
import { WebsocketProvider } from 'y-websocket'
import * as Y from 'yjs'
import { can, readBoard, readSheet, updateChorus, type Role } from '@/shared/board'
import {
  CHANNEL_PATH,
  DOCUMENT_PATH,
  roomOf,
  type ChannelEvents,
  type ChannelReply,
  type ChannelRequest,
  type CHANNEL_REQUESTS,
} from '@/shared/wire/rooms'
import type { z } from 'zod'
import { DraftStore, type Storage } from './draft-store'
import { KeptClock } from './kept-clock'
import { closedReasonOf, EMPTY_VIEW, type RoomView } from './room-view'
import { shareBoard, shareParts, shareSheet } from './share'

export type Who = Readonly<{ role: Exclude<Role, 'nobody'>; memberId: string | null }>

/** What a live room takes from its surroundings; a browser has all of it. */
export type Surroundings = Readonly<{
  origin: string
  storage: Storage | null
  webSocket?: typeof WebSocket
  /** Headers a browser sends by itself. */
  extraHeaders?: Record<string, string>
  /** Calls back when the next picture is due. */
  nextFrame: (work: () => void) => void
}>

type Channel = Socket<
  ChannelEvents,
  { [Name in ChannelRequest]: (payload: unknown, reply: (reply: ChannelReply) => void) => void }
>
type Listener<Name extends keyof ChannelEvents> = ChannelEvents[Name]

/** Origin of changes that come from another tab's drafts. */
const FROM_DRAFTS = 'drafts'
const REPLY_TIMEOUT_MS = 8_000
const RETRY_MS = 1_500

export class LiveRoom {
  readonly docs: Readonly<{ board: Y.Doc; sheet: Y.Doc | null; chorus: Y.Doc | null }>
  readonly #surroundings: Surroundings
  readonly #providers: readonly WebsocketProvider[]
  readonly #channel: Channel
  /** Documents that this screen writes, by their rooms' names. */
  readonly #clocks = new Map<string, KeptClock>()
  readonly #drafts: DraftStore | null
  readonly #listeners = new Set<() => void>()
  #view: RoomView = EMPTY_VIEW
  #wasLive = false
  #isFrameDue = false
  #chorusKeys = new Set<string>()
  #retry: ReturnType<typeof setTimeout> | null = null
  #isDestroyed = false

  constructor(lessonId: string, who: Who, surroundings: Surroundings) {
    const { role, memberId } = who
    this.#surroundings = surroundings
    const ownId = can(role, 'see own sheet') ? memberId : null
    const board = new Y.Doc()
    const sheet = ownId === null ? null : new Y.Doc()
    const chorus = can(role, 'see chorus') ? new Y.Doc() : null
    this.docs = { board, sheet, chorus }
    this.#drafts = ownId === null ? null : new DraftStore(surroundings.storage, lessonId, ownId)
    if (can(role, 'write board')) this.#clocks.set(roomOf.board(lessonId), new KeptClock(board))
    if (sheet && ownId) this.#clocks.set(roomOf.sheet(lessonId, ownId), new KeptClock(sheet))
    this.#readDrafts()
    this.#observe()
    this.#providers = [
      this.#connect(roomOf.board(lessonId), board),
      ...(sheet && ownId ? [this.#connect(roomOf.sheet(lessonId, ownId), sheet)] : []),
      ...(chorus ? [this.#connect(roomOf.chorus(lessonId), chorus)] : []),
    ]
    this.#channel = io(surroundings.origin, {
      path: CHANNEL_PATH,
      transports: ['websocket'],
      auth: { lessonId },
      extraHeaders: surroundings.extraHeaders,
      reconnectionDelayMax: RETRY_MS,
      forceNew: true,
    })
    this.#listen()
  }

  readonly subscribe = (listener: () => void): (() => void) => {
    this.#listeners.add(listener)
    return () => this.#listeners.delete(listener)
  }

  readonly getView = (): RoomView => this.#view

  /** Hears cues and changes of the lesson. Gives the way to stop. */
  on<Name extends 'cue' | 'lesson'>(name: Name, listener: Listener<Name>): () => void {
    this.#channel.on(name, listener as never)
    return () => this.#channel.off(name, listener as never)
  }

  /** Asks something of the class channel. Without an answer in time it is refused, never forgotten. */
  async send<Name extends ChannelRequest>(
    name: Name,
    payload: z.infer<(typeof CHANNEL_REQUESTS)[Name]>,
  ): Promise<ChannelReply> {
    if (!this.#channel.connected) return { ok: false, error: 'offline' }
    // One call for every request: its name and its payload belong together, which the library's types cannot follow.
    const asker = this.#channel.timeout(REPLY_TIMEOUT_MS) as unknown as {
      emitWithAck: (name: string, payload: unknown) => Promise<unknown>
    }
    try {
      return (await asker.emitWithAck(name, payload)) as ChannelReply
    } catch {
      return { ok: false, error: 'offline' }
    }
  }

  /** Another tab has written drafts: they are taken in here too. */
  readonly onStorage = (key: string | null): void => {
    if (key === this.#drafts?.key) this.#readDrafts()
  }

  /** Tries again at once; for when the screen wakes up or the network is back. */
  readonly wake = (): void => {
    if (this.#isDestroyed || this.#view.connection === 'closed') return
    for (const provider of this.#providers) if (!provider.wsconnected) provider.connect()
    if (!this.#channel.connected) this.#channel.connect()
  }

  destroy(): void {
    this.#isDestroyed = true
    if (this.#retry) clearTimeout(this.#retry)
    this.#channel.close()
    for (const provider of this.#providers) {
      provider.destroy()
      provider.awareness.destroy()
    }
    for (const doc of [this.docs.board, this.docs.sheet, this.docs.chorus]) doc?.destroy()
    this.#listeners.clear()
  }

  #connect(room: string, doc: Y.Doc): WebsocketProvider {
    const { origin, webSocket } = this.#surroundings
    const url = origin.replace(/^http/, 'ws') + DOCUMENT_PATH
    // Tabs of different people may be open in one browser: documents go by the server only.
    const provider = new WebsocketProvider(url, room, doc, {
      disableBc: true,
      ...(webSocket && { WebSocketPolyfill: webSocket }),
    })
    provider.awareness.setLocalState(null)
    provider.on('status', () => this.#refresh())
    provider.on('sync', () => this.#refresh())
    provider.on('closed', ({ code }) => this.#close(code))
    doc.on('update', (update: Uint8Array, origin: unknown) => {
      const clock = this.#clocks.get(room)
      if (origin === provider) clock?.received(update)
      this.#holdDrafts(doc)
      if (clock) this.#refresh()
    })
    return provider
  }

  #observe(): void {
    const { board, sheet, chorus } = this.docs
    board.on('afterTransaction', () =>
      this.#change({ board: shareBoard(this.#view.board, readBoard(board)) }),
    )
    sheet?.on('afterTransaction', () =>
      this.#change({ sheet: shareSheet(this.#view.sheet, readSheet(sheet)) }),
    )
    chorus?.getMap<unknown>('proposals').observe(({ keysChanged }) => {
      for (const key of keysChanged as Set<string>) this.#chorusKeys.add(key)
      this.#askFrame(chorus)
    })
  }

  /** The whole room may speak at once: the chorus is read once a picture. */
  #askFrame(chorus: Y.Doc): void {
    if (this.#isFrameDue) return
    this.#isFrameDue = true
    this.#surroundings.nextFrame(() => {
      this.#isFrameDue = false
      if (this.#isDestroyed) return
      const keys = this.#chorusKeys
      this.#chorusKeys = new Set()
      this.#change({ chorus: updateChorus(this.#view.chorus, chorus, keys) })
    })
  }

  #listen(): void {
    const channel = this.#channel
    channel.on('connect', () => this.#refresh())
    channel.on('disconnect', (reason) => {
      this.#change({ hindrance: null })
      this.#refresh()
      // The server has let go of us and says why only to one who asks again.
      if (reason === 'io server disconnect') this.#retryLater()
    })
    channel.on('connect_error', () => {
      this.#refresh()
      if (!channel.active) this.#retryLater()
    })
    channel.on('presence', ({ here, hands, members }) => {
      const presence = { here, hands, members: members ?? null }
      this.#change({ presence: shareParts(this.#view.presence, presence) })
    })
    channel.on('ownHand', ({ up }) => this.#change({ isHandUp: up }))
    channel.on('kept', ({ room, clocks }) => {
      this.#clocks.get(room)?.acknowledge(clocks)
      if (this.docs.sheet) this.#holdDrafts(this.docs.sheet)
      this.#refresh()
    })
    channel.on('keeping', (state) => {
      this.#change({ hindrance: state.ok ? null : state.because })
      this.#refresh()
    })
  }

  /** Refused by the class channel itself: the documents' close codes tell why, or it comes right with time. */
  #retryLater(): void {
    if (this.#retry || this.#isDestroyed || this.#view.connection === 'closed') return
    this.#retry = setTimeout(() => {
      this.#retry = null
      if (!this.#isDestroyed && this.#view.connection !== 'closed') this.#channel.connect()
    }, RETRY_MS)
  }

  #close(code: number): void {
    this.#change({ connection: 'closed', closedBecause: closedReasonOf(code) ?? 'bad-request' })
    for (const provider of this.#providers) provider.disconnect()
    this.#channel.disconnect()
    this.#refresh()
  }

  #readDrafts(): void {
    const drafts = this.#drafts?.read()
    if (drafts && this.docs.sheet) Y.applyUpdate(this.docs.sheet, drafts, FROM_DRAFTS)
    if (this.docs.sheet) this.#view = { ...this.#view, sheet: readSheet(this.docs.sheet) }
  }

  #holdDrafts(doc: Y.Doc): void {
    if (doc !== this.docs.sheet || !this.#drafts) return
    const isKept = [...this.#clocks.values()].every(({ isAllKept }) => isAllKept)
    if (isKept) this.#drafts.release(doc)
    else this.#drafts.hold(doc)
  }

  /** Works out how the connection and the keeping stand. */
  #refresh(): void {
    if (this.#isDestroyed) return
    const isLive = this.#channel.connected && this.#providers.every(({ synced }) => synced)
    if (isLive) this.#wasLive = true
    const isKept = [...this.#clocks.values()].every(({ isAllKept }) => isAllKept)
    const isGoing = isLive && this.#view.hindrance === null && this.#view.connection !== 'closed'
    this.#change({
      kept: isKept ? 'kept' : isGoing ? 'sending' : 'waiting',
      ...(this.#view.connection !== 'closed' && {
        connection: isLive ? 'live' : this.#wasLive ? 'offline' : 'connecting',
      }),
    })
  }

  #change(parts: Partial<RoomView>): void {
    const view = shareParts(this.#view, { ...this.#view, ...parts })
    if (view === this.#view) return
    this.#view = view
    for (const listener of this.#listeners) listener()
  }
}
