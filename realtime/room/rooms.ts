import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { listDocuments, upsertSnapshot } from '@/db/queries/journal'
import { listLessonMembers } from '@/db/queries/lesson-members'
import { findLesson } from '@/db/queries/lessons'
import { CLOSE } from '@/shared/wire/rooms'
import { Beat } from './beat'
import { Recovery } from './recovery'
import { Room, type RoomHost } from './room'

/** How long a lesson stays in memory after the last one left: phones come back from a lift or a reload. */
const GRACE_MS = 30_000

export type RoomsOptions = Readonly<{
  db: Connection
  log: Logger
  nowMs?: () => number
  graceMs?: number
  kept: RoomHost['kept']
  keeping: RoomHost['keeping']
  stageChanged: RoomHost['stageChanged']
}>

type Entry = { opening: Promise<Room | null>; room: Room | null; held: number; timer: NodeJS.Timeout | null }

/** The lessons that are in memory: opened for the first who comes, kept while anybody is there, written whole at the end. */
export class Rooms {
  readonly #options: RoomsOptions
  readonly #entries = new Map<string, Entry>()
  readonly #beat: Beat
  readonly #recovery: Recovery
  readonly #snapshotting = new Set<Room>()
  readonly #host: RoomHost

  constructor(options: RoomsOptions) {
    const { db, log, nowMs = Date.now } = options
    this.#options = options
    this.#recovery = new Recovery({ db, log, onGone: (room) => this.#drop(room) })
    this.#beat = new Beat({
      db,
      log,
      nowMs,
      onKept: (room) => void this.#snapshot(room),
      onLost: (room, trouble) => {
        room.loseBeat(trouble)
        if (trouble === 'lesson-gone') this.#drop(room)
        else this.#recovery.add(room)
      },
    })
    this.#host = {
      nowMs,
      log,
      ask: (room, delayMs) => this.#beat.ask(room, delayMs),
      kept: options.kept,
      keeping: options.keeping,
      stageChanged: options.stageChanged,
    }
  }

  get size(): number {
    return this.#entries.size
  }

  /** The room if it is in memory. */
  peek(lessonId: string): Room | null {
    return this.#entries.get(lessonId)?.room ?? null
  }

  /** Opens a lesson's room for one more; whoever got one calls `leave`. Null when there is no such lesson. */
  async enter(lessonId: string): Promise<Room | null> {
    let entry = this.#entries.get(lessonId)
    if (!entry) {
      entry = { opening: this.#open(lessonId), room: null, held: 0, timer: null }
      this.#entries.set(lessonId, entry)
    }
    if (entry.timer) clearTimeout(entry.timer)
    entry.timer = null
    entry.held += 1
    try {
      entry.room = await entry.opening
    } catch (error) {
      if (this.#entries.get(lessonId) === entry) this.#entries.delete(lessonId)
      throw error
    }
    if (!entry.room && this.#entries.get(lessonId) === entry) this.#entries.delete(lessonId)
    return entry.room
  }

  leave(lessonId: string): void {
    const entry = this.#entries.get(lessonId)
    if (!entry) return
    entry.held -= 1
    if (entry.held > 0) return
    entry.timer = setTimeout(() => void this.#unload(lessonId, entry), this.#options.graceMs ?? GRACE_MS)
    entry.timer.unref()
  }

  async #open(lessonId: string): Promise<Room | null> {
    const { db } = this.#options
    const [stored, members, lesson] = await Promise.all([
      listDocuments(db, lessonId),
      listLessonMembers(db, lessonId),
      findLesson(db, lessonId),
    ])
    if (!stored.some(({ document }) => document === 'board')) return null
    const removed = members.filter(({ isRemoved }) => isRemoved).map(({ id }) => id)
    const room = new Room(lessonId, stored, removed, this.#host)
    room.isEnded = lesson?.status === 'ended'
    return room
  }

  /** Keeps a lesson whole in the journal, so that it is opened quickly next time. */
  async keepWhole(room: Room): Promise<void> {
    await room.flush()
    await this.#snapshot(room, 1)
  }

  async #snapshot(room: Room, atLeast?: number): Promise<void> {
    const due = room.documentsToSnapshot(atLeast)
    if (due.length === 0 || this.#snapshotting.has(room)) return
    this.#snapshotting.add(room)
    const taken = due.map((live) => ({ live, ...live.snapshot() }))
    try {
      for (const { live, ordinal, bytes, clients } of taken) {
        const at = new Date(this.#host.nowMs())
        const { lessonId } = room
        await upsertSnapshot(this.#options.db, {
          lessonId,
          document: live.name,
          ordinal,
          bytes,
          clients,
          at,
        })
        live.snapshotTaken(ordinal)
      }
    } catch (error) {
      // Nothing is lost: the changes themselves are in the journal.
      this.#options.log.warn({ err: error, lessonId: room.lessonId }, 'a snapshot was not written')
    } finally {
      this.#snapshotting.delete(room)
    }
  }

  async #unload(lessonId: string, entry: Entry): Promise<void> {
    const { room } = entry
    if (room && !room.trouble) await this.keepWhole(room)
    if (entry.held > 0 || this.#entries.get(lessonId) !== entry) return
    this.#entries.delete(lessonId)
    if (room) this.#forget(room)
  }

  #forget(room: Room): void {
    this.#beat.forget(room)
    this.#recovery.forget(room)
    room.destroy()
  }

  /** The lesson was removed from the database while people were in it. */
  #drop(room: Room): void {
    room.closeWhere(() => true, CLOSE.notFound)
    this.#entries.delete(room.lessonId)
    this.#forget(room)
  }

  all(): readonly Room[] {
    return [...this.#entries.values()].flatMap(({ room }) => room ?? [])
  }

  /** Writes what has come, and ends. */
  async close(): Promise<void> {
    await Promise.all(this.all().map((room) => room.flush()))
    this.#beat.stop()
    this.#recovery.stop()
    for (const entry of this.#entries.values()) if (entry.timer) clearTimeout(entry.timer)
    for (const room of this.all()) room.destroy()
    this.#entries.clear()
  }
}
