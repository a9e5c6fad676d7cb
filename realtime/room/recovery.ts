import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { listDocuments, probeJournal } from '@/db/queries/journal'
import { parseTrouble } from '@/realtime/journal/database-trouble'
import type { Room } from './room'

const RETRY_MS = 1_000

export type RecoveryOptions = Readonly<{
  db: Connection
  log: Logger
  /** The lesson is no longer in the database. */
  onGone: (room: Room) => void
}>

/** Brings rooms back whose journal could not be written: tries it until it can, then starts from what it says. */
export class Recovery {
  readonly #options: RecoveryOptions
  readonly #rooms = new Set<Room>()
  #timer: NodeJS.Timeout | null = null
  #isStopped = false

  constructor(options: RecoveryOptions) {
    this.#options = options
  }

  add(room: Room): void {
    this.#rooms.add(room)
    this.#arm()
  }

  forget(room: Room): void {
    this.#rooms.delete(room)
  }

  stop(): void {
    this.#isStopped = true
    if (this.#timer) clearTimeout(this.#timer)
  }

  #arm(): void {
    if (this.#timer || this.#isStopped || this.#rooms.size === 0) return
    this.#timer = setTimeout(() => {
      void this.#tryAll().finally(() => {
        this.#timer = null
        this.#arm()
      })
    }, RETRY_MS)
  }

  async #tryAll(): Promise<void> {
    for (const room of [...this.#rooms]) {
      try {
        await probeJournal(this.#options.db, room.lessonId)
        const stored = await listDocuments(this.#options.db, room.lessonId)
        if (!this.#rooms.delete(room) || this.#isStopped) continue
        room.resume(stored)
        this.#options.log.info({ lessonId: room.lessonId }, 'the journal is written again')
      } catch (error) {
        const trouble = parseTrouble(error)
        if (trouble === 'lesson-gone') {
          this.#rooms.delete(room)
          this.#options.onGone(room)
          continue
        }
        this.#options.log.warn({ trouble, lessonId: room.lessonId }, 'the journal cannot be written yet')
        // The others would wait for the same thing.
        if (trouble === 'database') return
      }
    }
  }
}
