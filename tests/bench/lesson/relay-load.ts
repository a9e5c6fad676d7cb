import { once } from 'node:events'
import { WebSocket } from 'ws'
import * as Y from 'yjs'
import { formatStep1, formatUpdate, parseFrame } from '@/realtime/connection/frames'
import { wait } from './room-load'

const BARS = 11

/** The same phones on the bare relay: one document that every phone writes and hears, and a wall that applies it. */
export class RelayLoad {
  readonly #wall = new Y.Doc()
  readonly #sentAtMs = new Map<string, number>()
  readonly #sockets: WebSocket[] = []
  readonly #writers: Y.Doc[] = []
  readonly latenciesMs: number[] = []

  static async open(origin: string, phones: number): Promise<RelayLoad> {
    const load = new RelayLoad()
    const url = `${origin.replace('http', 'ws')}/lesson`
    const wall = await load.#connect(url, (bytes) => Y.applyUpdate(load.#wall, bytes))
    wall.send(formatStep1(load.#wall))
    load.#wall.getMap('proposals').observe(({ keysChanged }) => {
      for (const key of keysChanged as Set<string>) load.#arrived(key)
    })
    for (let phone = 0; phone < phones; phone += 1) {
      const socket = await load.#connect(url, () => {})
      const doc = new Y.Doc()
      doc.on('update', (update: Uint8Array) => socket.send(formatUpdate(update)))
      load.#writers.push(doc)
    }
    return load
  }

  async #connect(url: string, onUpdate: (bytes: Uint8Array) => void): Promise<WebSocket> {
    const socket = new WebSocket(url, { perMessageDeflate: false })
    this.#sockets.push(socket)
    socket.on('message', (data: Buffer) => {
      const frame = parseFrame(data)
      if (frame.ok && (frame.value.kind === 'update' || frame.value.kind === 'step2')) {
        onUpdate(frame.value.bytes)
      }
    })
    await once(socket, 'open')
    return socket
  }

  #arrived(key: string): void {
    const sent = this.#sentAtMs.get(key)
    if (sent === undefined) return
    this.#sentAtMs.delete(key)
    this.latenciesMs.push(performance.now() - sent)
  }

  /** Writes evenly for a while, until the wall has everything. Gives the number of changes. */
  async write(changesASecond: number, durationMs: number): Promise<number> {
    const phones = this.#writers.length
    const start = performance.now()
    let done = 0
    while (performance.now() - start < durationMs) {
      const due = Math.floor(((performance.now() - start) / 1000) * changesASecond)
      for (; done < due; done += 1) {
        const phone = done % phones
        const key = `${1 + (Math.floor(done / phones) % BARS)}:phone-${phone}`
        this.#sentAtMs.set(key, performance.now())
        const notes = [{ pitch: done % 2 ? 'A4' : 'C5', ticks: 1920 }]
        this.#writers[phone]?.getMap('proposals').set(key, { notes, round: 1 })
      }
      await wait(2)
    }
    for (let polls = 0; polls < 2_000 && this.#sentAtMs.size > 0; polls += 1) await wait(10)
    return done
  }

  close(): void {
    for (const socket of this.#sockets) socket.terminate()
  }
}
