import { createId } from '@/db/create-id'
import {
  can,
  readBoard,
  readChorus,
  readSheet,
  releaseBars,
  writeSheetBar,
  type Act,
  type Role,
} from '@/shared/board'
import { CLOSE, roomOf, type ChannelReply } from '@/shared/wire/rooms'
import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import type { TestCookie } from './support/cookies'
import { insertTestLesson, type TestLesson, type TestMember } from './support/lesson'
import { startLiveServer, type LiveServer } from './support/live-server'
import { openChannel, openDocument, whenSynced, type Channel, type OpenDocument } from './support/phones'
import { until } from './support/until'

const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

/** Everybody who may come to the door, and whether they belong to this lesson. */
const VISITORS = [
  'teacher',
  'assistant',
  'student',
  'guest',
  'wall',
  'signed out',
  'ended session',
  'removed student',
  'teacher of another lesson',
  'guest of another lesson',
  'wall of another lesson',
] as const
type Visitor = (typeof VISITORS)[number]

/** The role that counts, and the code with which those who have none are sent off. */
const STANDING: Readonly<Record<Visitor, { role: Role; code: number }>> = {
  teacher: { role: 'teacher', code: CLOSE.forbidden.code },
  assistant: { role: 'assistant', code: CLOSE.forbidden.code },
  student: { role: 'student', code: CLOSE.forbidden.code },
  guest: { role: 'guest', code: CLOSE.forbidden.code },
  wall: { role: 'wall', code: CLOSE.forbidden.code },
  'signed out': { role: 'nobody', code: CLOSE.signedOut.code },
  'ended session': { role: 'nobody', code: CLOSE.signedOut.code },
  'removed student': { role: 'nobody', code: CLOSE.removed.code },
  'teacher of another lesson': { role: 'nobody', code: CLOSE.forbidden.code },
  'guest of another lesson': { role: 'nobody', code: CLOSE.forbidden.code },
  'wall of another lesson': { role: 'nobody', code: CLOSE.forbidden.code },
}

describe('who may do what, asked over real sockets', () => {
  let database: TestDatabase
  let server: LiveServer
  let lesson: TestLesson
  let other: TestLesson
  const open: { close: () => void }[] = []

  beforeAll(async () => {
    database = await createTestDatabase()
    server = await startLiveServer(database.db)
  })
  beforeEach(async () => {
    lesson = await insertTestLesson(database.db, { students: 3 })
    other = await insertTestLesson(database.db)
    await database.db
      .updateTable('lessonMember')
      .set({ isRemoved: true })
      .where('id', '=', student(2).memberId)
      .execute()
  })
  afterEach(() => {
    for (const one of open.splice(0)) one.close()
  })
  afterAll(async () => {
    await server?.close()
    await database?.drop()
  })

  const student = (index: number) => lesson.students[index] as TestMember

  function cookieOf(visitor: Visitor): TestCookie | null {
    const sessionId = createId()
    const as = ({ memberId }: TestMember) => ({ sessionId, memberId })
    switch (visitor) {
      case 'teacher':
        return as(lesson.teacher)
      case 'assistant':
        return as(lesson.assistant)
      case 'student':
        return as(student(0))
      case 'guest':
        return as(lesson.guest)
      case 'wall':
        return { sessionId, wallOf: lesson.lessonId }
      case 'signed out':
        return null
      case 'ended session':
        server.endedSessions.add(sessionId)
        return as(lesson.teacher)
      case 'removed student':
        return as(student(2))
      case 'teacher of another lesson':
        return as(other.teacher)
      case 'guest of another lesson':
        return as(other.guest)
      case 'wall of another lesson':
        return { sessionId, wallOf: other.lessonId }
    }
  }

  const openAs = (visitor: Visitor, room: string): OpenDocument => {
    const made = openDocument(server.origin, room, cookieOf(visitor))
    open.push(made)
    return made
  }
  const channelAs = (visitor: Visitor): Channel => {
    const made = openChannel(server.origin, lesson.lessonId, cookieOf(visitor))
    open.push(made)
    return made
  }

  describe.each(VISITORS)('%s', (visitor) => {
    const { role, code } = STANDING[visitor]

    /** Opens a document and finds that it is let in exactly when the table says so. */
    async function knock(room: string, act: Act): Promise<OpenDocument | null> {
      const document = openAs(visitor, room)
      await until(() => document.provider.synced || document.closedCode() !== null)
      expect(document.closedCode()).toBe(can(role, act) ? null : code)
      return can(role, act) ? document : null
    }

    it('reads and writes the board as the table says', async () => {
      const board = await knock(roomOf.board(lesson.lessonId), 'see board')
      if (!board) return
      const witness = openAs('teacher', roomOf.board(lesson.lessonId))
      await whenSynced(witness)
      expect(readBoard(board.doc)).toEqual(readBoard(witness.doc))
      releaseBars(board.doc, [1])
      if (can(role, 'write board')) await until(() => readBoard(witness.doc)?.bars[1]?.state === 'released')
      else {
        await until(() => board.closedCode() !== null)
        expect(board.closedCode()).toBe(CLOSE.forbidden.code)
        expect(readBoard(witness.doc)?.bars[1]?.state).toBe('frozen')
      }
    })

    it('reads the chorus as the table says, and writes none', async () => {
      const chorus = await knock(roomOf.chorus(lesson.lessonId), 'see chorus')
      if (!chorus) return
      chorus.doc.getMap('proposals').set(`1:${student(0).memberId}`, { notes: whole('A4'), round: 1 })
      await until(() => chorus.closedCode() !== null)
      expect(chorus.closedCode()).toBe(CLOSE.forbidden.code)
      const witness = openAs('teacher', roomOf.chorus(lesson.lessonId))
      await whenSynced(witness)
      expect(readChorus(witness.doc)).toEqual({})
    })

    it("reads another's sheet as the table says, and writes none", async () => {
      const room = roomOf.sheet(lesson.lessonId, student(1).memberId)
      const sheet = await knock(room, 'see every sheet')
      if (!sheet) return
      writeSheetBar(sheet.doc, 1, whole('A4'), 1)
      await until(() => sheet.closedCode() !== null)
      expect(sheet.closedCode()).toBe(CLOSE.forbidden.code)
      const witness = openAs('assistant', room)
      await whenSynced(witness)
      expect(readSheet(witness.doc).notes).toEqual({})
    })

    it('asks of the class channel what the table allows, and is refused the rest', async () => {
      const channel = channelAs(visitor)
      let refusal: string | null = null
      channel.on('connect_error', (error) => (refusal = error.message))
      await until(() => channel.connected || refusal !== null)
      expect(channel.connected).toBe(role !== 'nobody')
      if (role === 'nobody') return
      const ask = (name: string, payload: unknown) =>
        channel.timeout(5_000).emitWithAck(name, payload) as Promise<ChannelReply>
      const pupil = openChannel(server.origin, lesson.lessonId, {
        sessionId: createId(),
        memberId: student(1).memberId,
      })
      open.push(pupil)
      await until(() => pupil.connected)
      const requests: readonly (readonly [string, unknown, Act])[] = [
        ['hand', { up: true }, 'raise hand'],
        ['lowerHand', { memberId: student(1).memberId }, 'lower any hand'],
        ['cue', { kind: 'stop' }, 'cue wall'],
        ['remove', { memberId: student(1).memberId }, 'remove member'],
      ]
      for (const [name, payload, act] of requests) {
        expect([name, await ask(name, payload)]).toEqual([
          name,
          can(role, act) ? { ok: true } : { ok: false, error: 'forbidden' },
        ])
      }
    })
  })

  it('lets a leader remove neither a leader nor somebody of another lesson', async () => {
    const channel = channelAs('teacher')
    await until(() => channel.connected)
    for (const { memberId } of [
      lesson.assistant,
      lesson.teacher,
      other.guest,
      other.students[0] as TestMember,
    ]) {
      const reply = await channel.timeout(5_000).emitWithAck('remove', { memberId })
      expect(reply).toEqual({ ok: false, error: 'not-found' })
    }
  })

  it('refuses malformed requests of the class channel, and goes on', async () => {
    const channel = channelAs('teacher')
    await until(() => channel.connected)
    const deep = JSON.parse('['.repeat(200) + ']'.repeat(200)) as unknown
    const payloads: unknown[] = [
      null,
      'stop',
      { kind: 'play' },
      { kind: 'stop', more: 1 },
      { kind: 'play', voices: 'both', fromBar: 1, toBar: 2, tempo: 60, proposal: { 1: deep } },
    ]
    for (const payload of payloads) {
      const reply = await channel.timeout(5_000).emitWithAck('cue', payload)
      expect(reply).toEqual({ ok: false, error: 'bad-request' })
    }
    expect(await channel.timeout(5_000).emitWithAck('cue', { kind: 'stop' })).toEqual({ ok: true })
  })

  it('takes no connection from a page of another origin', async () => {
    const elsewhere = openDocument(server.origin, roomOf.board(lesson.lessonId), cookieOf('teacher'))
    open.push(elsewhere)
    await whenSynced(elsewhere)
    const { WebSocket: Socket } = await import('ws')
    const url = `${server.origin.replace('http', 'ws')}/live/${roomOf.board(lesson.lessonId)}`
    for (const headers of [{ origin: 'https://elsewhere.example' }, {}]) {
      const socket = new Socket(url, { headers })
      const status = await new Promise((resolve) => {
        socket.on('unexpected-response', (_, response) => resolve(response.statusCode))
        socket.on('error', () => {})
      })
      expect(status).toBe(403)
    }
  })

  it('ends the connections of a session that is ended, and no other', async () => {
    const cookie = cookieOf('teacher') as TestCookie
    const mine = openDocument(server.origin, roomOf.board(lesson.lessonId), cookie)
    const theirs = openAs('student', roomOf.board(lesson.lessonId))
    open.push(mine)
    await whenSynced(mine)
    await whenSynced(theirs)
    server.endedSessions.add(cookie.sessionId)
    server.realtime.sessionEnded(cookie.sessionId)
    await until(() => mine.closedCode() !== null)
    expect(mine.closedCode()).toBe(CLOSE.signedOut.code)
    expect(theirs.provider.wsconnected).toBe(true)
  })

  it('identifies a member again whose role has changed', async () => {
    const board = openAs('student', roomOf.board(lesson.lessonId))
    await whenSynced(board)
    await database.db
      .updateTable('lessonMember')
      .set({ role: 'assistant' })
      .where('id', '=', student(0).memberId)
      .execute()
    await server.realtime.memberChanged(lesson.lessonId, student(0).memberId)
    await until(() => !board.provider.synced)
    await whenSynced(board)
    const witness = openAs('teacher', roomOf.board(lesson.lessonId))
    await whenSynced(witness)
    releaseBars(board.doc, [4])
    await until(() => readBoard(witness.doc)?.bars[4]?.state === 'released')
    expect(board.closedCode()).toBeNull()
  })

  it('closes an ended lesson to its class, with everything kept, and leaves it to its teacher to read', async () => {
    const desk = openAs('student', roomOf.sheet(lesson.lessonId, student(0).memberId))
    await whenSynced(desk)
    writeSheetBar(desk.doc, 1, whole('A4'), 1)
    const lectern = openAs('teacher', roomOf.sheet(lesson.lessonId, student(0).memberId))
    await until(() => readSheet(lectern.doc).notes[1] !== undefined)
    await database.db
      .updateTable('lesson')
      .set({ status: 'ended', code: null })
      .where('id', '=', lesson.lessonId)
      .execute()
    await server.realtime.lessonEnded(lesson.lessonId)
    await until(() => desk.closedCode() !== null && lectern.closedCode() !== null)
    expect(desk.closedCode()).toBe(CLOSE.ended.code)
    const late = openAs('student', roomOf.board(lesson.lessonId))
    await until(() => late.closedCode() !== null)
    expect(late.closedCode()).toBe(CLOSE.ended.code)
    const board = openAs('teacher', roomOf.board(lesson.lessonId))
    await whenSynced(board)
    releaseBars(board.doc, [1])
    await until(() => board.closedCode() !== null)
    expect(board.closedCode()).toBe(CLOSE.forbidden.code)
  })
})
