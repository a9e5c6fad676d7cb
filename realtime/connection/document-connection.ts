import type { WebSocket } from 'ws'
import type { LessonIdentity } from '@/realtime/contract'
import type { LiveDocument } from '@/realtime/document/live-document'
import type { CLOSE } from '@/shared/wire/rooms'
import { WIRE_LIMITS } from '@/shared/wire/rooms'
import { formatStep1 } from './frames'
import { RateBucket } from './rate-bucket'

export type Closing = (typeof CLOSE)[keyof typeof CLOSE]

/** What may wait to be sent to one screen. One that reads slower than that is let go, and comes back for the rest. */
const OUTGOING_BYTES = 8 * 1024 * 1024

/** Changes of one connection that may wait for the next beat. */
const WAITING_BYTES = 2 * WIRE_LIMITS.firstSyncBytes

/** Times a connection may build on what the server has not, before it is no longer taken for honest. */
const LOST_TIMES = 8

/** One socket on one document. */
export class DocumentConnection {
  readonly identity: LessonIdentity
  readonly live: LiveDocument
  readonly canWrite: boolean
  readonly #socket: WebSocket
  readonly #bucket: RateBucket
  /** Answers to our step 1 that are still owed: they may be larger, for they carry the whole delete set. */
  #owedAnswers = 0
  #waitingBytes = 0
  #lostTimes = 0
  isAlive = true

  constructor(
    socket: WebSocket,
    identity: LessonIdentity,
    live: LiveDocument,
    canWrite: boolean,
    nowMs: number,
  ) {
    this.#socket = socket
    this.identity = identity
    this.live = live
    this.canWrite = canWrite
    this.#bucket = new RateBucket(WIRE_LIMITS.messagesASecond, nowMs)
  }

  /** Whether one more message may be heard now. */
  mayHear(nowMs: number): boolean {
    return this.#bucket.take(nowMs)
  }

  /** Cap of the update that has just come, by what was asked for. */
  capBytes(kind: 'step2' | 'update'): number {
    if (kind === 'update' || this.#owedAnswers === 0) return WIRE_LIMITS.updateBytes
    this.#owedAnswers -= 1
    return WIRE_LIMITS.firstSyncBytes
  }

  /** Counts a change that waits for the beat; false when too much is waiting. */
  queue(bytes: number): boolean {
    this.#waitingBytes += bytes
    return this.#waitingBytes <= WAITING_BYTES
  }

  unqueue(bytes: number): void {
    this.#waitingBytes -= bytes
  }

  forgetQueue(): void {
    this.#waitingBytes = 0
  }

  /** Asks for everything the other side has and we have not. */
  askForMissing(): void {
    this.#owedAnswers += 1
    this.send(formatStep1(this.live.doc))
  }

  /** A change built on what is not here: asks for it. False when that has happened too often. */
  isLost(): boolean {
    this.#lostTimes += 1
    if (this.#lostTimes > LOST_TIMES) return false
    this.askForMissing()
    return true
  }

  isFound(): void {
    this.#lostTimes = 0
  }

  send(frame: Uint8Array): void {
    if (this.#socket.readyState !== this.#socket.OPEN) return
    if (this.#socket.bufferedAmount > OUTGOING_BYTES) this.#socket.terminate()
    else this.#socket.send(frame)
  }

  ping(): void {
    if (this.#socket.readyState === this.#socket.OPEN) this.#socket.ping()
  }

  close({ code, reason }: Closing): void {
    this.#socket.close(code, reason)
  }

  terminate(): void {
    this.#socket.terminate()
  }
}
