import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { insertJournal } from '@/db/queries/journal'
import { isOfOneLesson, parseTrouble, type Trouble } from '@/realtime/journal/database-trouble'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import type { Batch } from './batch'
import type { Room } from './room'

type Begun = Readonly<{ room: Room; batch: Batch }>

export type BeatOptions = Readonly<{
  db: Connection
  log: Logger
  nowMs: () => number
  /** A room whose beat was kept. */
  onKept: (room: Room) => void
  /** A room whose beat was not kept. */
  onLost: (room: Room, trouble: Trouble) => void
}>

/**
 * The pulse of the house: what arrived together, in whatever lessons, is journaled together by one INSERT. One is on its
 * way at a time; a room that nothing happens in costs nothing.
 */
export class Beat {
  readonly #options: BeatOptions
  #due = new Set<Room>()
  #timer: NodeJS.Timeout | null = null
  readonly #later = new Map<Room, NodeJS.Timeout>()
  #isRunning = false
  #lastMs = -Infinity
  #isStopped = false

  constructor(options: BeatOptions) {
    this.#options = options
  }

  ask(room: Room, delayMs = 0): void {
    if (this.#isStopped) return
    if (delayMs > WIRE_LIMITS.beatMs) {
      if (this.#later.has(room)) return
      const timer = setTimeout(() => {
        this.#later.delete(room)
        this.ask(room)
      }, delayMs)
      this.#later.set(room, timer)
      return
    }
    this.#due.add(room)
    this.#arm()
  }

  forget(room: Room): void {
    this.#due.delete(room)
    clearTimeout(this.#later.get(room))
    this.#later.delete(room)
  }

  stop(): void {
    this.#isStopped = true
    if (this.#timer) clearTimeout(this.#timer)
    for (const timer of this.#later.values()) clearTimeout(timer)
    this.#later.clear()
  }

  #arm(): void {
    if (this.#timer || this.#isRunning || this.#due.size === 0) return
    // A lone change goes at once; a crowd is gathered.
    const waitMs = Math.max(0, this.#lastMs + WIRE_LIMITS.beatMs - performance.now())
    this.#timer = setTimeout(() => {
      this.#timer = null
      void this.#run()
    }, waitMs)
  }

  async #run(): Promise<void> {
    this.#isRunning = true
    this.#lastMs = performance.now()
    const rooms = this.#due
    this.#due = new Set()
    const begun = [...rooms].flatMap((room) => this.#begin(room))
    await this.#keep(begun)
    this.#isRunning = false
    this.#arm()
  }

  #begin(room: Room): readonly Begun[] {
    try {
      const batch = room.beginBeat(this.#options.nowMs())
      return batch ? [{ room, batch }] : []
    } catch (error) {
      this.#options.log.error({ err: error, lessonId: room.lessonId }, 'a beat broke off')
      this.#options.onLost(room, 'refused')
      return []
    }
  }

  async #keep(begun: readonly Begun[]): Promise<void> {
    if (begun.length === 0) return
    try {
      const changes = begun.flatMap(({ batch }) => batch.journalChanges())
      const entries = begun.flatMap(({ batch }) => batch.entries)
      if (changes.length > 0) await insertJournal(this.#options.db, changes, entries)
    } catch (error) {
      const trouble = parseTrouble(error)
      if (isOfOneLesson(trouble) && begun.length > 1) {
        for (const one of begun) await this.#keep([one])
        return
      }
      const lessons = begun.map(({ batch }) => batch.lessonId)
      this.#options.log.error({ err: error, trouble, lessons }, 'the journal did not take a beat')
      for (const { room } of begun) this.#options.onLost(room, trouble)
      return
    }
    for (const { room, batch } of begun) {
      room.endBeat(batch)
      this.#options.onKept(room)
    }
  }
}
