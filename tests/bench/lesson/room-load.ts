import { createId } from '@/db/create-id'
import { parseProposalKey, readBoard, releaseBars, writeSheetBar } from '@/shared/board'
import { DOCUMENT_PATH, roomOf } from '@/shared/wire/rooms'
import type { TestLesson } from '@/tests/realtime/support/lesson'
import type { WebSocket } from 'ws'
import { openRaw, openRawChannel, type RawDocument } from './raw-client'

const PITCHES = ['A4', 'B4', 'C5', 'D5', 'E5', 'F5'] as const
const BARS = 11
/** Phones that come in at the same time; a crowd at the door is another line's work. */
const AT_ONCE = 40

export const wait = (ms: number): Promise<void> => new Promise((resolve) => setTimeout(resolve, ms))

/** A lesson full of phones, with a wall on which every change is awaited. */
export class RoomLoad {
  readonly #sockets: WebSocket[] = []
  readonly #sentAtMs = new Map<string, number>()
  #phones: RawDocument[] = []
  /** From a phone's send to the wall's document, in milliseconds. */
  latenciesMs: number[] = []
  readonly #writesOf = new Map<number, number>()

  private constructor(readonly lesson: TestLesson) {}

  static async open(origin: string, lesson: TestLesson): Promise<RoomLoad> {
    const load = new RoomLoad(lesson)
    const { lessonId } = lesson
    const live = origin.replace('http', 'ws') + DOCUMENT_PATH
    const teacher = { sessionId: createId(), memberId: lesson.teacher.memberId }
    const board = openRaw(`${live}/${roomOf.board(lessonId)}`, teacher)
    const wall = openRaw(`${live}/${roomOf.chorus(lessonId)}`, { sessionId: createId(), wallOf: lessonId })
    load.#sockets.push(board.socket, wall.socket)
    await Promise.all([board.synced, wall.synced])
    wall.doc.getMap('proposals').observe(({ keysChanged }) => {
      for (const key of keysChanged as Set<string>) load.#arrived(key)
    })
    releaseBars(board.doc, Object.keys(readBoard(board.doc)?.bars ?? {}).map(Number))
    for (let from = 0; from < lesson.students.length; from += AT_ONCE) {
      const members = lesson.students.slice(from, from + AT_ONCE)
      const phones = await Promise.all(
        members.map(async ({ memberId }) => {
          const cookie = { sessionId: createId(), memberId }
          const phone = openRaw(`${live}/${roomOf.sheet(lessonId, memberId)}`, cookie)
          const own = openRaw(`${live}/${roomOf.board(lessonId)}`, cookie, { isDeaf: true })
          load.#sockets.push(phone.socket, own.socket, await openRawChannel(origin, lessonId, cookie))
          await Promise.all([phone.synced, own.synced])
          return phone
        }),
      )
      load.#phones.push(...phones)
    }
    return load
  }

  #arrived(key: string): void {
    const sent = this.#sentAtMs.get(key)
    if (sent === undefined || !parseProposalKey(key)) return
    this.#sentAtMs.delete(key)
    this.latenciesMs.push(performance.now() - sent)
  }

  /** One phone writes one bar, another note than before. */
  write(phone: number): void {
    const { doc } = this.#phones[phone] as RawDocument
    const memberId = this.lesson.students[phone]?.memberId as string
    const turn = this.#writesOf.get(phone) ?? 0
    this.#writesOf.set(phone, turn + 1)
    const bar = 1 + (turn % BARS)
    const pitch = PITCHES[(Math.floor(turn / BARS) + phone) % PITCHES.length] as string
    this.#sentAtMs.set(`${bar}:${memberId}`, performance.now())
    writeSheetBar(doc, bar, [{ pitch, ticks: 1920 }], 1)
  }

  get phones(): number {
    return this.#phones.length
  }

  /** Changes that were sent and have not reached the wall. */
  get missing(): number {
    return this.#sentAtMs.size
  }

  close(): void {
    for (const socket of this.#sockets) socket.terminate()
    for (const { doc } of this.#phones) doc.destroy()
  }
}

/** Lets all phones of some rooms write `changesASecond` in all, evenly, for a while. Gives the number of changes. */
export async function writeEvenly(
  rooms: readonly RoomLoad[],
  changesASecond: number,
  durationMs: number,
): Promise<number> {
  const turns = rooms.flatMap((room, place) =>
    Array.from({ length: room.phones }, (_, phone) => ({ room, phone, order: phone * rooms.length + place })),
  )
  turns.sort((a, b) => a.order - b.order)
  const start = performance.now()
  let done = 0
  while (performance.now() - start < durationMs) {
    const due = Math.floor(((performance.now() - start) / 1000) * changesASecond)
    for (; done < due; done += 1) {
      const { room, phone } = turns[done % turns.length] as (typeof turns)[number]
      room.write(phone)
    }
    await wait(2)
  }
  for (let polls = 0; polls < 500 && rooms.some(({ missing }) => missing > 0); polls += 1) await wait(10)
  return done
}
