/** A room without sockets, database or clock: frames travel when the test says so, and the journal is a list. */
import pino from 'pino'
import * as Y from 'yjs'
import type { JournalChange, JournalEntry, StoredDocument } from '@/db/queries/journal'
import { DocumentConnection } from '@/realtime/connection/document-connection'
import { formatStep1, formatStep2, formatUpdate, parseFrame } from '@/realtime/connection/frames'
import type { LessonIdentity } from '@/realtime/contract'
import { SERVER_CLIENT_ID } from '@/realtime/document/limits'
import type { LiveDocument } from '@/realtime/document/live-document'
import { Room } from '@/realtime/room/room'
import { createBoardState, deriveBoardEvents, writeBoardState } from '@/shared/board'
import { EXERCISE, STAGE } from './lesson'
import type { Random } from './random'

export const LESSON_ID = 'simulated-lesson'

/** What the database would hold. */
export class ListJournal {
  readonly changes: JournalChange[] = []
  readonly entries: JournalEntry[] = []

  constructor() {
    const doc = new Y.Doc()
    doc.clientID = SERVER_CLIENT_ID
    const state = createBoardState(EXERCISE, STAGE)
    writeBoardState(doc, state)
    const stamp = { lessonId: LESSON_ID, author: null, at: new Date(0) }
    this.changes.push({ ...stamp, document: 'board', ordinal: 1, bytes: Y.encodeStateAsUpdate(doc) })
    this.entries.push(...deriveBoardEvents(null, state).map((event) => ({ ...stamp, event })))
  }

  stored(): readonly StoredDocument[] {
    const names = [...new Set(this.changes.map(({ document }) => document))]
    return names.map((document) => {
      const changes = this.changes.filter((change) => change.document === document)
      return { document, ordinal: changes.length, snapshot: null, clients: {}, changes }
    })
  }

  /** As the primary key does, refuses a change whose place is taken. */
  append(changes: readonly JournalChange[], entries: readonly JournalEntry[]): void {
    for (const { document, ordinal } of changes) {
      if (this.changes.some((other) => other.document === document && other.ordinal === ordinal)) {
        throw new Error(`${document} has a change ${ordinal} already`)
      }
    }
    this.changes.push(...changes)
    this.entries.push(...entries)
  }

  docOf(name: string): Y.Doc {
    const doc = new Y.Doc()
    for (const { document, bytes } of this.changes) if (document === name) Y.applyUpdate(doc, bytes)
    return doc
  }
}

/** Frames on their way, in both directions, with every mishap a network has. */
class Wire {
  readonly #inFlight: { deliver: (frame: Uint8Array) => void; frame: Uint8Array }[] = []
  isTroubled = true

  constructor(readonly random: Random) {}

  send(frame: Uint8Array, deliver: (frame: Uint8Array) => void): void {
    this.#inFlight.push({ frame, deliver })
    if (this.isTroubled && this.random.chance(0.1)) this.#inFlight.push({ frame, deliver })
  }

  get isQuiet(): boolean {
    return this.#inFlight.length === 0
  }

  /** Delivers one frame: usually the oldest, now and then another, now and then only a part of it. */
  step(): void {
    const isOutOfTurn = this.isTroubled && this.random.chance(0.15)
    const at = isOutOfTurn ? this.random.below(this.#inFlight.length) : 0
    const [taken] = this.#inFlight.splice(at, 1)
    if (!taken) return
    const isCut = this.isTroubled && this.random.chance(0.03)
    taken.deliver(isCut ? taken.frame.slice(0, this.random.below(taken.frame.length)) : taken.frame)
  }
}

/** One device on one document. It comes back whenever it was let go, as y-websocket does. */
export class SimulatedPhone {
  readonly doc = new Y.Doc()
  readonly kept = new Map<number, number>()
  #line = 0
  #close: (() => void) | null = null

  constructor(
    readonly house: SimulatedHouse,
    readonly identity: LessonIdentity,
    readonly kind: 'board' | 'sheet' | 'chorus',
  ) {
    this.doc.on('update', (update: Uint8Array, origin: unknown) => {
      if (origin !== this) this.#up?.(formatUpdate(update))
    })
  }

  #up: ((frame: Uint8Array) => void) | null = null

  get isConnected(): boolean {
    return this.#up !== null
  }

  connect(): void {
    this.disconnect()
    const { room, wire } = this.house
    const line = (this.#line += 1)
    const live = this.#document(room)
    const isHere = () => this.#line === line
    const socket = {
      readyState: 1,
      OPEN: 1,
      bufferedAmount: 0,
      send: (frame: Uint8Array) => wire.send(frame, (delivered) => isHere() && this.#hear(delivered)),
      close: () => isHere() && this.disconnect(),
      terminate: () => isHere() && this.disconnect(),
      ping: () => {},
    }
    const canWrite = this.kind !== 'chorus'
    const connection = new DocumentConnection(socket as never, this.identity, live, canWrite, 0)
    this.#close = () => {
      socket.readyState = 3
      room.disconnect(connection)
    }
    this.#up = (frame) =>
      wire.send(frame, (delivered) => {
        if (!isHere() || this.house.room !== room) return
        const parsed = parseFrame(delivered)
        if (parsed.ok) room.receive(connection, parsed.value)
        else this.disconnect()
      })
    this.#up(formatStep1(this.doc))
    room.connect(connection)
  }

  disconnect(): void {
    this.#line += 1
    this.#up = null
    this.#close?.()
    this.#close = null
  }

  #document(room: Room): LiveDocument {
    if (this.kind === 'board') return room.board
    return this.kind === 'chorus'
      ? room.chorus
      : (room.sheetOf(this.identity.memberId as string) as LiveDocument)
  }

  #hear(frame: Uint8Array): void {
    const parsed = parseFrame(frame)
    // A cut frame breaks a real connection too.
    if (!parsed.ok) return this.disconnect()
    if (parsed.value.kind === 'awareness') return
    const { kind, bytes } = parsed.value
    if (kind === 'step1') this.#up?.(formatStep2(this.doc, bytes))
    else Y.applyUpdate(this.doc, bytes, this)
  }

  acknowledge(clocks: Readonly<Record<string, number>>): void {
    for (const [client, clock] of Object.entries(clocks)) {
      this.kept.set(Number(client), Math.max(clock, this.kept.get(Number(client)) ?? 0))
    }
  }

  get isKept(): boolean {
    return Y.getState(this.doc.store, this.doc.clientID) <= (this.kept.get(this.doc.clientID) ?? 0)
  }
}

/** The server side: a room, its beats, and a journal that may fail. */
export class SimulatedHouse {
  readonly journal = new ListJournal()
  readonly wire: Wire
  readonly phones: SimulatedPhone[] = []
  room: Room
  #nowMs = 0
  isAsked = false

  constructor(readonly random: Random) {
    this.wire = new Wire(random)
    this.room = this.#open()
  }

  #open(): Room {
    return new Room(LESSON_ID, this.journal.stored(), [], {
      nowMs: () => this.#nowMs,
      ask: () => (this.isAsked = true),
      kept: (_, memberId, room, clocks) => {
        for (const phone of this.phones) {
          const name = phone.kind === 'sheet' ? `sheet/${phone.identity.memberId}` : phone.kind
          if (phone.identity.memberId === memberId && room === `${LESSON_ID}/${name}`)
            phone.acknowledge(clocks)
        }
      },
      keeping: () => {},
      stageChanged: () => {},
      log: pino({ level: 'silent' }),
    })
  }

  /** One beat. `outcome`: kept; lost before it was written; or written, with the answer lost. */
  beat(outcome: 'kept' | 'lost' | 'answer lost' = 'kept'): void {
    this.#nowMs += 500
    this.isAsked = false
    const batch = this.room.beginBeat(this.#nowMs)
    if (!batch) return
    if (outcome !== 'lost') {
      this.journal.append(batch.journalChanges(), batch.entries)
    }
    if (outcome === 'kept') return this.room.endBeat(batch)
    this.room.loseBeat('database')
    this.room.resume(this.journal.stored())
  }

  /** The process is killed, and another starts from the journal. */
  kill(): void {
    for (const phone of this.phones) phone.disconnect()
    this.room = this.#open()
  }

  /** Lets everything come to rest on a network without mishaps. */
  settle(): void {
    this.wire.isTroubled = false
    for (let rounds = 0; rounds < 200; rounds += 1) {
      for (const phone of this.phones) if (!phone.isConnected) phone.connect()
      while (!this.wire.isQuiet) this.wire.step()
      this.beat()
      const isDone = this.wire.isQuiet && !this.isAsked && this.room.isIdle
      if (isDone && this.phones.every(({ isConnected }) => isConnected)) return
    }
    throw new Error('The room did not come to rest')
  }
}
