/** Clients without y-websocket's machinery, so that hundreds of them fit into the process that makes the load. */
import { once } from 'node:events'
import { WebSocket } from 'ws'
import * as Y from 'yjs'
import { formatStep1, formatStep2, formatUpdate, parseFrame } from '@/realtime/connection/frames'
import { CHANNEL_PATH } from '@/shared/wire/rooms'
import { formatCookie, type TestCookie } from '@/tests/realtime/support/cookies'

export type RawDocument = Readonly<{
  doc: Y.Doc
  socket: WebSocket
  /** Resolves at the first full answer of the server. */
  synced: Promise<void>
}>

const headersOf = (origin: string, cookie: TestCookie) => ({ origin, cookie: formatCookie(cookie) })

/** A document that is kept up to date, and whose own changes are sent. `isDeaf`: hears, but does not apply. */
export function openRaw(url: string, cookie: TestCookie, { isDeaf = false } = {}): RawDocument {
  const doc = new Y.Doc()
  const { origin } = new URL(url.replace(/^ws/, 'http'))
  const socket = new WebSocket(url, { headers: headersOf(origin, cookie), perMessageDeflate: false })
  socket.on('open', () => socket.send(formatStep1(doc)))
  const synced = new Promise<void>((resolve) => {
    socket.on('message', (data: Buffer) => {
      const frame = parseFrame(data)
      if (!frame.ok || frame.value.kind === 'awareness') return
      const { kind, bytes } = frame.value
      if (kind === 'step1') socket.send(formatStep2(doc, bytes))
      else if (kind === 'step2' || !isDeaf) Y.applyUpdate(doc, bytes, socket)
      if (kind === 'step2') resolve()
    })
  })
  doc.on('update', (update: Uint8Array, source: unknown) => {
    if (source !== socket && socket.readyState === socket.OPEN) socket.send(formatUpdate(update))
  })
  return { doc, socket, synced }
}

/** The class channel in the few words of its protocol that a phone needs. */
export async function openRawChannel(
  origin: string,
  lessonId: string,
  cookie: TestCookie,
): Promise<WebSocket> {
  const url = `${origin.replace('http', 'ws')}${CHANNEL_PATH}/?EIO=4&transport=websocket`
  const socket = new WebSocket(url, { headers: headersOf(origin, cookie), perMessageDeflate: false })
  socket.on('message', (data: Buffer) => {
    const text = data.toString()
    if (text.startsWith('0')) socket.send(`40${JSON.stringify({ lessonId })}`)
    else if (text === '2') socket.send('3')
  })
  await once(socket, 'open')
  return socket
}
