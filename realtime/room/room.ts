import type { Logger } from 'pino'
import * as Y from 'yjs'
import type { StoredDocument } from '@/db/queries/journal'
import type { Closing, DocumentConnection } from '@/realtime/connection/document-connection'
import { formatStep2, formatUpdate, type Frame } from '@/realtime/connection/frames'
import type { LessonIdentity } from '@/realtime/contract'
import { admitUpdate } from '@/realtime/document/admit-update'
import { CHANGES_A_SNAPSHOT } from '@/realtime/document/limits'
import { LiveDocument } from '@/realtime/document/live-document'
import { parseUpdate, type ParsedUpdate } from '@/realtime/document/parse-update'
import type { Trouble } from '@/realtime/journal/database-trouble'
import { can, readBoard, type BoardState } from '@/shared/board'
import { CLOSE, WIRE_LIMITS } from '@/shared/wire/rooms'
import { Batch } from './batch'
import { Scribe } from './scribe'

/** What a room asks of the house around it. */
export type RoomHost = Readonly<{
  nowMs: () => number
  /** There is something for the next beat, or for one that comes `delayMs` later. */
  ask: (room: Room, delayMs?: number) => void
  /** Everything a member wrote in a document up to these clocks is in the journal. */
  kept: (lessonId: string, memberId: string, room: string, clocks: Readonly<Record<string, number>>) => void
  /** The journal cannot be written, or can again. */
  keeping: (lessonId: string, trouble: Trouble | null) => void
  stageChanged: (lessonId: string) => void
  log: Logger
}>

type Waiting = Readonly<{ connection: DocumentConnection; update: ParsedUpdate }>

/**
 * The documents of one lesson and everybody connected to them. Changes wait for the beat; the beat applies them, lets the
 * scribe carry them, and hands all of it to the journal; only what the journal took is sent to others and acknowledged.
 * Between beats memory and journal are the same, so what a newcomer is given is always kept.
 */
export class Room {
  readonly lessonId: string
  readonly board: LiveDocument
  readonly chorus: LiveDocument
  readonly sheets = new Map<string, LiveDocument>()
  readonly connections = new Set<DocumentConnection>()
  /** An ended lesson is read and no longer written. */
  isEnded = false
  readonly #connectionsOf = new Map<LiveDocument, Set<DocumentConnection>>()
  readonly #host: RoomHost
  readonly #scribe: Scribe
  #waiting: Waiting[] = []
  #boardState: BoardState | null
  #isInFlight = false
  #trouble: Trouble | null = null
  /** Work that must not see what is not kept yet. */
  #whenSettled: (() => void)[] = []
  #flushed: (() => void)[] = []

  constructor(
    lessonId: string,
    stored: readonly StoredDocument[],
    removed: Iterable<string>,
    host: RoomHost,
  ) {
    const named = (name: string) => stored.find(({ document }) => document === name) ?? null
    this.lessonId = lessonId
    this.#host = host
    this.board = new LiveDocument('board', null, named('board'))
    this.chorus = new LiveDocument('chorus', null, named('chorus'))
    for (const document of stored) {
      const memberId = parseSheetName(document.document)
      if (memberId !== null) this.sheets.set(memberId, new LiveDocument('sheet', memberId, document))
    }
    this.#scribe = new Scribe(this.board, this.chorus, this.sheets, removed)
    this.#boardState = readBoard(this.board.doc)
  }

  get boardState(): BoardState | null {
    return this.#boardState
  }

  get trouble(): Trouble | null {
    return this.#trouble
  }

  get isIdle(): boolean {
    return this.#waiting.length === 0 && !this.#isInFlight
  }

  get documents(): readonly LiveDocument[] {
    return [this.board, this.chorus, ...this.sheets.values()]
  }

  /** A member's sheet, made when first asked for; null when the lesson has as many as it may. */
  sheetOf(memberId: string): LiveDocument | null {
    const known = this.sheets.get(memberId)
    if (known) return known
    if (this.sheets.size >= WIRE_LIMITS.membersALesson) return null
    const made = new LiveDocument('sheet', memberId, null)
    this.sheets.set(memberId, made)
    return made
  }

  /** Whether one more connection of this person (or wall) may open on a document. */
  mayConnect(identity: LessonIdentity, live: LiveDocument): boolean {
    let count = 0
    for (const { identity: other } of this.#connectionsOf.get(live) ?? []) {
      const isSame =
        identity.memberId === null
          ? other.sessionId === identity.sessionId
          : other.memberId === identity.memberId
      if (isSame) count += 1
    }
    return count < WIRE_LIMITS.connectionsAMember
  }

  connect(connection: DocumentConnection): void {
    this.connections.add(connection)
    const others = this.#connectionsOf.get(connection.live)
    if (others) others.add(connection)
    else this.#connectionsOf.set(connection.live, new Set([connection]))
    if (!connection.canWrite) return
    this.#settled(() => {
      connection.askForMissing()
      this.#acknowledge(connection.identity.memberId as string, connection.live)
    })
  }

  disconnect(connection: DocumentConnection): void {
    this.connections.delete(connection)
    const others = this.#connectionsOf.get(connection.live)
    others?.delete(connection)
    if (others?.size === 0) this.#connectionsOf.delete(connection.live)
  }

  /** Takes one message. What is wrong with it is its connection's trouble and nobody else's. */
  receive(connection: DocumentConnection, frame: Frame): void {
    if (frame.kind === 'awareness') return
    if (frame.kind === 'step1') {
      if (frame.bytes.byteLength > WIRE_LIMITS.updateBytes) return connection.close(CLOSE.tooLarge)
      return this.#settled(() => connection.send(formatStep2(connection.live.doc, frame.bytes)))
    }
    const { bytes } = frame
    if (bytes.byteLength > connection.capBytes(frame.kind)) return connection.close(CLOSE.tooLarge)
    const update = parseUpdate(connection.live.kind, bytes)
    if (!update.ok) return this.#refuse(connection, CLOSE.malformed, update.reason)
    if (!connection.canWrite) {
      const isEmpty = update.value.structs.length === 0 && update.value.deletes.length === 0
      return isEmpty ? undefined : this.#refuse(connection, CLOSE.forbidden, 'reader-wrote')
    }
    // It is asked for again when the journal can be written.
    if (this.#trouble) return
    if (!connection.queue(bytes.byteLength)) return connection.close(CLOSE.tooFast)
    this.#waiting.push({ connection, update: update.value })
    this.#host.ask(this)
  }

  /** Takes a member's proposals off the wall and lets the member write no more. */
  removeMember(memberId: string): void {
    this.#scribe.remove(memberId)
    this.closeWhere((identity) => identity.memberId === memberId, CLOSE.removed)
    this.#host.ask(this)
  }

  closeWhere(matches: (identity: LessonIdentity) => boolean, closing: Closing): void {
    for (const connection of [...this.connections]) {
      if (matches(connection.identity)) connection.close(closing)
    }
  }

  /** Applies what waits. Null when there is nothing to keep or to acknowledge. */
  beginBeat(nowMs: number): Batch | null {
    if (this.#isInFlight || this.#trouble) return null
    const batch = new Batch(this.lessonId, new Date(nowMs))
    const before = this.#boardState
    const waiting = this.#waiting
    this.#waiting = []
    for (const { connection, update } of waiting) {
      connection.unqueue(update.bytes.byteLength)
      this.#apply(batch, connection, update)
    }
    const dueMs = this.#scribe.write(batch, before, this.#boardState, nowMs)
    if (dueMs !== null) this.#host.ask(this, dueMs)
    if (batch.isEmpty) return null
    this.#isInFlight = true
    if (before?.stage !== this.#boardState?.stage) {
      this.#whenSettled.push(() => this.#host.stageChanged(this.lessonId))
    }
    return batch
  }

  #apply(batch: Batch, connection: DocumentConnection, update: ParsedUpdate): void {
    const { live, identity } = connection
    const author = identity.memberId as string
    const admitted = admitUpdate(live.doc, live.owners, author, update)
    if (!admitted.ok) {
      if (admitted.reason === 'missing-predecessor' && connection.isLost()) return
      return this.#refuse(connection, CLOSE.malformed, admitted.reason)
    }
    connection.isFound()
    const cap = live.kind === 'board' ? WIRE_LIMITS.boardBytes : WIRE_LIMITS.sheetBytes
    if (live.bytes + update.bytes.byteLength > cap) {
      live.fold()
      if (live.bytes + update.bytes.byteLength > cap) return connection.close(CLOSE.tooLarge)
    }
    batch.addAck(author, live)
    const change = live.apply(update, author, admitted.value)
    if (!change) return
    batch.addChange(live, change.bytes, author, connection)
    if (live === this.board) {
      const before = this.#boardState
      this.#boardState = readBoard(live.doc)
      batch.addEvents(author, this.#scribe.boardEvents(before, this.#boardState))
    } else this.#scribe.note(author, change.keys)
  }

  #refuse(connection: DocumentConnection, closing: Closing, problem: string): void {
    const { memberId, role } = connection.identity
    this.#host.log.warn({ lessonId: this.lessonId, memberId, role, problem }, 'refused a live message')
    connection.close(closing)
  }

  /** The journal has the beat: others are told, authors are told. */
  endBeat(batch: Batch): void {
    this.#isInFlight = false
    for (const { live, bytes, from } of batch.changes) {
      live.keep(bytes)
      const others = this.#connectionsOf.get(live)
      if (!others || (others.size === 1 && from !== null && others.has(from))) continue
      const frame = formatUpdate(bytes)
      for (const connection of others) if (connection !== from) connection.send(frame)
    }
    for (const [memberId, documents] of batch.acks) {
      for (const live of documents) this.#acknowledge(memberId, live)
    }
    this.#settle()
  }

  /** The journal did not take it: as if it had never come. It is asked for again when the journal can be written. */
  loseBeat(trouble: Trouble): void {
    this.#isInFlight = false
    this.#trouble = trouble
    for (const connection of this.connections) connection.forgetQueue()
    this.#waiting = []
    for (const live of this.documents) live.rollBack()
    this.#boardState = readBoard(this.board.doc)
    this.#scribe.startAgain()
    this.#settle()
    this.#host.keeping(this.lessonId, trouble)
  }

  /**
   * Goes on after trouble from what the journal says, which may be more than was acknowledged: the beat that seemed to
   * fail may have been written. Everybody is sent what they lack and asked for what we lack.
   */
  resume(stored: readonly StoredDocument[]): void {
    for (const document of stored) {
      const memberId = parseSheetName(document.document)
      if (memberId !== null) this.sheetOf(memberId)
    }
    for (const live of this.documents) {
      const known = Y.encodeStateVector(live.doc)
      live.restore(stored.find(({ document }) => document === live.name) ?? null)
      const connections = this.#connectionsOf.get(live)
      if (!connections) continue
      const frame = formatUpdate(Y.encodeStateAsUpdate(live.doc, known))
      for (const connection of connections) connection.send(frame)
    }
    this.#boardState = readBoard(this.board.doc)
    this.#scribe.startAgain()
    this.#trouble = null
    for (const connection of this.connections) {
      if (!connection.canWrite) continue
      connection.askForMissing()
      this.#acknowledge(connection.identity.memberId as string, connection.live)
    }
    this.#host.keeping(this.lessonId, null)
    this.#host.stageChanged(this.lessonId)
  }

  /** Tells a member again how much of their writing is kept, on every document they write. */
  acknowledgeAll(identity: LessonIdentity): void {
    const { memberId, role } = identity
    if (memberId === null) return
    this.#settled(() => {
      if (can(role, 'write board')) this.#acknowledge(memberId, this.board)
      const sheet = this.sheets.get(memberId)
      if (sheet) this.#acknowledge(memberId, sheet)
    })
  }

  #acknowledge(memberId: string, live: LiveDocument): void {
    if (this.#trouble) return
    this.#host.kept(this.lessonId, memberId, `${this.lessonId}/${live.name}`, live.clocksOf(memberId))
  }

  /** Documents that have changed so often that they are better kept whole. */
  documentsToSnapshot(atLeast = CHANGES_A_SNAPSHOT): readonly LiveDocument[] {
    if (this.#isInFlight || this.#trouble) return []
    return this.documents.filter((live) => live.changesSinceSnapshot >= atLeast)
  }

  /** Resolves when all that has come so far is kept, or cannot be. */
  flush(): Promise<void> {
    if (this.isIdle || this.#trouble) return Promise.resolve()
    this.#host.ask(this)
    return new Promise((resolve) => this.#flushed.push(resolve))
  }

  #settled(work: () => void): void {
    if (this.#isInFlight) this.#whenSettled.push(work)
    else work()
  }

  #settle(): void {
    const work = this.#whenSettled
    this.#whenSettled = []
    for (const task of work) task()
    if (!this.isIdle) return
    const flushed = this.#flushed
    this.#flushed = []
    for (const resolve of flushed) resolve()
  }

  destroy(): void {
    for (const live of this.documents) live.destroy()
  }
}

const SHEET_PREFIX = 'sheet/'

const parseSheetName = (name: string): string | null =>
  name.startsWith(SHEET_PREFIX) ? name.slice(SHEET_PREFIX.length) : null
