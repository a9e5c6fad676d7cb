import * as encoding from 'lib0/encoding'
import { once } from 'node:events'
import { WebSocket } from 'ws'
import * as Y from 'yjs'
import { createId } from '@/db/create-id'
import { formatStep1, formatUpdate, parseFrame } from '@/realtime/connection/frames'
import { SERVER_CLIENT_ID } from '@/realtime/document/limits'
import { parseUpdate } from '@/realtime/document/parse-update'
import { readBoard, readChorus, readSheet, releaseBars, writeSheetBar } from '@/shared/board'
import { CHANNEL_PATH, CLOSE, DOCUMENT_PATH, roomOf, WIRE_LIMITS } from '@/shared/wire/rooms'
import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import { formatCookie, type TestCookie } from './support/cookies'
import { insertTestLesson, type TestLesson, type TestMember } from './support/lesson'
import { startLiveServer, type LiveServer } from './support/live-server'
import { openChannel, openDocument, Phone, whenSynced } from './support/phones'
import { Random } from './support/random'
import { until } from './support/until'

const SEED = 20_260_711
const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

/** An update made by writing into a document of our own. */
function updateOf(work: (doc: Y.Doc) => void, clientId?: number): Uint8Array {
  const doc = new Y.Doc()
  if (clientId !== undefined) doc.clientID = clientId
  work(doc)
  return Y.encodeStateAsUpdate(doc)
}

/** Nine bytes that announce thirty million structs: a plain apply makes an array for them. */
function announceMillions(): Uint8Array {
  const encoder = encoding.createEncoder()
  encoding.writeVarUint(encoder, 1)
  encoding.writeVarUint(encoder, 30_000_000)
  encoding.writeVarUint(encoder, 77)
  encoding.writeVarUint(encoder, 0)
  return encoding.toUint8Array(encoder)
}

const FORBIDDEN_UPDATES: Readonly<Record<string, Uint8Array>> = {
  'a nested map': updateOf((doc) => doc.getMap('notes').set('1', new Y.Map([['a', 1]]))),
  'a nested text': updateOf((doc) => doc.getMap('notes').set('1', new Y.Text('words'))),
  'a subdocument': updateOf((doc) => doc.getMap('notes').set('1', new Y.Doc())),
  'a list': updateOf((doc) => doc.getArray('notes').push([1, 2, 3])),
  'a text': updateOf((doc) => doc.getText('notes').insert(0, 'words')),
  'an unknown root': updateOf((doc) => doc.getMap('secrets').set('1', 1)),
  "another document's root": updateOf((doc) => doc.getMap('bars').set('1', 1)),
  'an unknown key': updateOf((doc) => doc.getMap('notes').set('41', 1)),
  'bytes for a value': updateOf((doc) => doc.getMap('notes').set('1', new Uint8Array(9))),
  'a null character': updateOf((doc) => doc.getMap('notes').set('1', { a: 'b\u0000' })),
  'a value nested too deep': updateOf((doc) =>
    doc.getMap('notes').set('1', JSON.parse('['.repeat(40) + ']'.repeat(40)) as unknown),
  ),
  'millions in nine bytes': announceMillions(),
  'nothing at all': new Uint8Array(0),
}

describe('what a hostile phone may send', () => {
  let database: TestDatabase
  let server: LiveServer
  let lesson: TestLesson
  const open: { close: () => void }[] = []

  beforeAll(async () => {
    console.info(`hostile frames: seed ${SEED}`)
    database = await createTestDatabase()
    server = await startLiveServer(database.db)
  })
  beforeEach(async () => {
    lesson = await insertTestLesson(database.db)
  })
  afterEach(() => {
    for (const one of open.splice(0)) one.close()
  })
  afterAll(async () => {
    await server?.close()
    await database?.drop()
  })

  const cookieOf = ({ memberId }: TestMember): TestCookie => ({ sessionId: createId(), memberId })
  const student = (index = 0) => lesson.students[index] as TestMember

  async function openRaw(room: string, cookie: TestCookie): Promise<WebSocket> {
    const url = server.origin.replace('http', 'ws') + `${DOCUMENT_PATH}/${room}`
    const headers = { origin: server.origin, cookie: formatCookie(cookie) }
    const socket = new WebSocket(url, { headers })
    open.push({ close: () => socket.terminate() })
    socket.on('error', () => {})
    await once(socket, 'open')
    return socket
  }
  const openSheet = (member: TestMember) =>
    openRaw(roomOf.sheet(lesson.lessonId, member.memberId), cookieOf(member))
  const closeCode = async (socket: WebSocket): Promise<number> => (await once(socket, 'close'))[0] as number

  it.each(Object.keys(FORBIDDEN_UPDATES))('refuses %s in a sheet', async (name) => {
    const socket = await openSheet(student())
    socket.send(formatUpdate(FORBIDDEN_UPDATES[name] as Uint8Array))
    expect(await closeCode(socket)).toBe(CLOSE.malformed.code)
    const witness = openDocument(
      server.origin,
      roomOf.sheet(lesson.lessonId, student().memberId),
      cookieOf(lesson.teacher),
    )
    open.push(witness)
    await whenSynced(witness)
    expect(Y.encodeStateVector(witness.doc)).toEqual(new Uint8Array([0]))
  })

  it('reads what announces millions without making room for them', () => {
    const before = process.memoryUsage().arrayBuffers + process.memoryUsage().heapUsed
    for (let times = 0; times < 200; times += 1)
      expect(parseUpdate('sheet', announceMillions()).ok).toBe(false)
    const after = process.memoryUsage().arrayBuffers + process.memoryUsage().heapUsed
    // One plain apply takes 240 MB.
    expect(after - before).toBeLessThan(100 * 1024 * 1024)
  })

  it('waits for no missing predecessor: asks for it, and in the end closes', async () => {
    const doc = new Y.Doc()
    writeSheetBar(doc, 1, whole('A4'), 1)
    const known = Y.encodeStateVector(doc)
    writeSheetBar(doc, 1, whole('B4'), 1)
    const later = Y.encodeStateAsUpdate(doc, known)
    const socket = await openSheet(student())
    let asked = 0
    socket.on('message', (data: Buffer) => {
      const frame = parseFrame(data)
      if (!frame.ok || frame.value.kind !== 'step1') return
      asked += 1
      socket.send(formatUpdate(later))
    })
    socket.send(formatUpdate(later))
    expect(await closeCode(socket)).toBe(CLOSE.malformed.code)
    expect(asked).toBeGreaterThan(1)
  })

  it("lets nobody write under the server's id or under another member's", async () => {
    const teacher = openDocument(server.origin, roomOf.board(lesson.lessonId), cookieOf(lesson.teacher))
    open.push(teacher)
    await whenSynced(teacher)
    releaseBars(teacher.doc, [1])
    const assistant = openDocument(server.origin, roomOf.board(lesson.lessonId), cookieOf(lesson.assistant))
    open.push(assistant)
    await until(() => readBoard(assistant.doc)?.bars[1]?.state === 'released')
    for (const stolen of [SERVER_CLIENT_ID, teacher.doc.clientID]) {
      const forged = new Y.Doc()
      Y.applyUpdate(forged, Y.encodeStateAsUpdate(assistant.doc))
      forged.clientID = stolen
      const known = Y.encodeStateVector(forged)
      releaseBars(forged, [2])
      const socket = await openRaw(roomOf.board(lesson.lessonId), cookieOf(lesson.assistant))
      socket.send(formatUpdate(Y.encodeStateAsUpdate(forged, known)))
      expect(await closeCode(socket)).toBe(CLOSE.malformed.code)
    }
    expect(readBoard(teacher.doc)?.bars[2]?.state).toBe('frozen')
  })

  it('closes with a reason what is too large or too fast', async () => {
    const large = await openSheet(student())
    const long = Array.from({ length: WIRE_LIMITS.updateBytes }, () => 1)
    large.send(formatUpdate(updateOf((doc) => doc.getMap('notes').set('1', long))))
    expect(await closeCode(large)).toBe(CLOSE.tooLarge.code)
    const fast = await openSheet(student(1))
    const frame = formatStep1(new Y.Doc())
    for (let times = 0; times < WIRE_LIMITS.messagesASecond * 10; times += 1) fast.send(frame)
    expect(await closeCode(fast)).toBe(CLOSE.tooFast.code)
  })

  it('lets no sheet grow past its cap', async () => {
    const doc = new Y.Doc()
    const socket = await openSheet(student())
    let acknowledged = 0
    doc.on('update', (update: Uint8Array) => socket.send(formatUpdate(update)))
    const channel = openChannel(server.origin, lesson.lessonId, cookieOf(student()))
    open.push(channel)
    channel.on('kept', ({ clocks }) => (acknowledged = Math.max(acknowledged, clocks[doc.clientID] ?? 0)))
    await until(() => channel.connected)
    const closed = closeCode(socket)
    const state: { code: number | null } = { code: null }
    void closed.then((code) => (state.code = code))
    const filling = 'x'.repeat(WIRE_LIMITS.updateBytes - 1_000)
    for (let bar = 1; bar <= 12 && state.code === null; bar += 1) {
      doc.getMap('notes').set(String(bar), { filling })
      await until(() => acknowledged >= bar || state.code !== null)
    }
    expect(state.code).toBe(CLOSE.tooLarge.code)
  })

  it('passes over values that do not parse: they stand on the sheet and go no further', async () => {
    const teacher = new Phone(server.origin, lesson.teacher)
    const chorus = openDocument(server.origin, roomOf.chorus(lesson.lessonId), cookieOf(lesson.teacher))
    const phone = new Phone(server.origin, student())
    open.push(teacher, chorus, phone)
    await whenSynced(teacher.board)
    await until(() => phone.isReady)
    releaseBars(teacher.board.doc, [1, 2])
    const odd: unknown[] = [
      7,
      'A4',
      [],
      { notes: [] },
      { notes: whole('H4'), round: 1 },
      { notes: whole('A4') },
    ]
    for (const value of odd) phone.sheet.doc.getMap('notes').set('1', value)
    writeSheetBar(phone.sheet.doc, 2, whole('A4'), 1)
    await until(() => readChorus(chorus.doc)[2] !== undefined)
    expect(readChorus(chorus.doc)[1]).toBeUndefined()
    expect(readSheet(phone.sheet.doc).notes[1]).toBeUndefined()
  })

  it('outlives thirty thousand malformed frames, and no other lesson notices', async () => {
    const random = new Random(SEED)
    const quiet = await insertTestLesson(database.db)
    const cookie = cookieOf(quiet.teacher)
    const board = openDocument(server.origin, roomOf.board(quiet.lessonId), cookie)
    const chorus = openDocument(server.origin, roomOf.chorus(quiet.lessonId), cookie)
    const phone = new Phone(server.origin, quiet.students[0] as TestMember)
    open.push(board, chorus, phone)
    await Promise.all([whenSynced(board), whenSynced(chorus)])
    await until(() => phone.isReady)
    releaseBars(board.doc, [1])

    const good = formatUpdate(updateOf((doc) => writeSheetBar(doc, 1, whole('A4'), 1)))
    const malformed = (): Uint8Array => {
      if (random.chance(0.3)) return random.bytes(random.below(60))
      const frame = Uint8Array.from(good)
      for (let changes = 1 + random.below(4); changes > 0; changes -= 1) {
        frame[random.below(frame.length)] = random.below(256)
      }
      return random.chance(0.3) ? frame.slice(0, random.below(frame.length)) : frame
    }
    const sheets = [0, 1].map((index) => roomOf.sheet(lesson.lessonId, student(index).memberId))
    let sent = 0
    let rounds = 0
    while (sent < 30_000) {
      const sockets = await Promise.all(
        Array.from({ length: 12 }, (_, index) =>
          openRaw(sheets[index % 2] as string, cookieOf(student(index % 2))),
        ),
      )
      for (const socket of sockets) {
        for (let frames = 0; frames < 220; frames += 1) socket.send(malformed())
        sent += 220
      }
      await Promise.all(sockets.map((socket) => socket.readyState === socket.CLOSED || once(socket, 'close')))
      rounds += 1
      // The other lesson works between and during the noise.
      const pitch = ['A4', 'B4', 'C5'][rounds % 3] as string
      writeSheetBar(phone.sheet.doc, 1, whole(pitch), 1)
      await until(
        () => readChorus(chorus.doc)[1]?.[quiet.students[0]?.memberId as string]?.notes[0]?.pitch === pitch,
      )
    }
    expect(phone.sheet.closedCode()).toBeNull()
    // Whatever of it parsed stayed on the two sheets it was sent to.
    const wall = openDocument(server.origin, roomOf.chorus(lesson.lessonId), cookieOf(lesson.teacher))
    open.push(wall)
    await whenSynced(wall)
    expect(readChorus(wall.doc)).toEqual({})
  })

  it('outlives malformed messages of the class channel', async () => {
    const random = new Random(SEED)
    const url = `${server.origin.replace('http', 'ws')}${CHANNEL_PATH}/?EIO=4&transport=websocket`
    const deep = '['.repeat(8_000) + ']'.repeat(8_000)
    const texts = [
      `420["cue",{"kind":"play","voices":"both","fromBar":1,"toBar":2,"tempo":60,"proposal":{"1":${deep}}}]`,
      `42["hand",${deep}]`,
      '451-["hand",{"_placeholder":true,"num":0}]',
      '42["__proto__",{}]',
      '42["hand"]',
      '40/admin,',
      '4',
      '9',
      '42{"a":1}',
    ]
    for (let round = 0; round < 40; round += 1) {
      const socket = new WebSocket(url, {
        headers: { origin: server.origin, cookie: formatCookie(cookieOf(student(round % 2))) },
      })
      socket.on('error', () => {})
      await once(socket, 'open')
      socket.send(`40${JSON.stringify({ lessonId: lesson.lessonId })}`)
      for (let messages = 0; messages < 25; messages += 1) {
        const text = random.pick(texts)
        socket.send(random.chance(0.5) ? text : text.slice(0, random.below(text.length)))
        if (random.chance(0.1)) socket.send(random.bytes(20))
      }
      socket.close()
      await once(socket, 'close')
    }
    const channel = openChannel(server.origin, lesson.lessonId, cookieOf(student()))
    open.push(channel)
    await until(() => channel.connected)
    expect(await channel.timeout(5_000).emitWithAck('hand', { up: true })).toEqual({ ok: true })
  })

  it('answers addresses that are none', async () => {
    const headers = { origin: server.origin, cookie: formatCookie(cookieOf(student())) }
    const base = server.origin.replace('http', 'ws')
    const rooms = ['x', `${lesson.lessonId}/plans`, `${lesson.lessonId}/sheet/`, '%00', '']
    for (const room of rooms) {
      const socket = new WebSocket(`${base}${DOCUMENT_PATH}/${room}`, { headers })
      expect(await closeCode(socket)).toBe(CLOSE.badRequest.code)
    }
    const unknown = new WebSocket(`${base}${DOCUMENT_PATH}/${createId()}/board`, { headers })
    expect(await closeCode(unknown)).toBe(CLOSE.notFound.code)
    const nowhere = new WebSocket(`${base}/elsewhere`, { headers })
    const status = await new Promise((resolve) => {
      nowhere.on('unexpected-response', (_, response) => resolve(response.statusCode))
      nowhere.on('error', () => {})
    })
    expect(status).toBe(404)
  })
})
