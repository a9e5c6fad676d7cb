import { WebSocket } from 'ws'
import * as Y from 'yjs'
import { formatStep1, formatStep2, formatUpdate, parseFrame } from '@/realtime/connection/frames'
import { lessons } from '@/shared/api/lessons'
import { writeSheetBar } from '@/shared/board'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { DOCUMENT_PATH, roomOf } from '@/shared/wire/rooms'

/** A guest's sheet held by this process: enough of a phone to propose with. */
export type GuestSheet = Readonly<{ propose: (bar: number, pitch: string) => void; close: () => void }>

/** Joins by code as a guest, through the API, and opens the sheet on the wire. */
export async function openGuestSheet(origin: string, code: string, name: string): Promise<GuestSheet> {
  const response = await fetch(origin + lessons.join.path, {
    method: 'POST',
    headers: { 'content-type': 'application/json', origin },
    body: JSON.stringify({ code, name }),
  })
  if (!response.ok) throw new Error(`A guest was refused (${response.status}): ${await response.text()}`)
  const cookie = response.headers
    .getSetCookie()
    .map((each) => each.split(';')[0])
    .join('; ')
  const { lessonId, memberId } = lessons.join.reply.parse(await response.json())
  const doc = new Y.Doc()
  const url = `${origin.replace('http', 'ws')}${DOCUMENT_PATH}/${roomOf.sheet(lessonId, memberId)}`
  const socket = new WebSocket(url, { headers: { origin, cookie }, perMessageDeflate: false })
  socket.on('open', () => socket.send(formatStep1(doc)))
  await new Promise<void>((resolve, reject) => {
    socket.on('close', (closeCode) => reject(new Error(`The sheet was closed with ${closeCode}`)))
    socket.on('error', reject)
    socket.on('message', (data: Buffer) => {
      const frame = parseFrame(data)
      if (!frame.ok || frame.value.kind === 'awareness') return
      const { kind, bytes } = frame.value
      if (kind === 'step1') socket.send(formatStep2(doc, bytes))
      else Y.applyUpdate(doc, bytes, socket)
      if (kind === 'step2') resolve()
    })
  })
  doc.on('update', (update: Uint8Array, source: unknown) => {
    if (source !== socket && socket.readyState === socket.OPEN) socket.send(formatUpdate(update))
  })
  return {
    propose: (bar, pitch) => writeSheetBar(doc, bar, [{ pitch, ticks: WHOLE_TICKS }], 1),
    close: () => socket.terminate(),
  }
}
