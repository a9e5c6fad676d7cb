import { LiveRoom, type Who } from '@/components/room/live-room'
import type { Storage } from '@/components/room/draft-store'
import { createId } from '@/db/create-id'
import { adoptBars, readChorus, readSheet, releaseBars, updateStage, writeSheetBar } from '@/shared/board'
import { roomOf } from '@/shared/wire/rooms'
import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import { formatCookie } from './support/cookies'
import { insertTestLesson, type TestLesson, type TestMember } from './support/lesson'
import { startLiveServer, type LiveServer } from './support/live-server'
import { openDocument, socketClass, whenSynced } from './support/phones'
import { until } from './support/until'

const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

class MemoryStorage implements Storage {
  readonly items = new Map<string, string>()
  getItem = (key: string) => this.items.get(key) ?? null
  setItem = (key: string, value: string) => void this.items.set(key, value)
  removeItem = (key: string) => void this.items.delete(key)
}

describe('the live room of a screen', () => {
  let database: TestDatabase
  let server: LiveServer
  let lesson: TestLesson
  const rooms = new Set<LiveRoom>()

  beforeAll(async () => {
    database = await createTestDatabase()
    server = await startLiveServer(database.db)
  })
  beforeEach(async () => {
    lesson = await insertTestLesson(database.db)
  })
  afterEach(() => {
    for (const room of rooms) room.destroy()
    rooms.clear()
  })
  afterAll(async () => {
    await server?.close()
    await database?.drop()
  })

  function enter(member: TestMember | 'wall', storage: Storage | null = null): LiveRoom {
    const { lessonId } = lesson
    const cookie =
      member === 'wall'
        ? { sessionId: createId(), wallOf: lessonId }
        : { sessionId: createId(), memberId: member.memberId }
    const who: Who =
      member === 'wall' ? { role: 'wall', memberId: null } : { role: member.role, memberId: member.memberId }
    const room = new LiveRoom(lessonId, who, {
      origin: server.origin,
      storage,
      webSocket: socketClass(server.origin, cookie),
      extraHeaders: { origin: server.origin, cookie: formatCookie(cookie) },
      nextFrame: (work) => setImmediate(work),
    })
    rooms.add(room)
    return room
  }
  const leave = (room: LiveRoom) => {
    room.destroy()
    rooms.delete(room)
  }
  const isLive = (room: LiveRoom) => room.getView().connection === 'live'
  const student = () => lesson.students[0] as TestMember

  it('shows lectern, wall and desk the same lesson', async () => {
    const [lectern, wall, desk] = [enter(lesson.teacher), enter('wall'), enter(student())]
    await until(() => [lectern, wall, desk].every(isLive))
    releaseBars(lectern.docs.board, [1])
    await until(() => desk.getView().board?.bars[1]?.state === 'released')
    writeSheetBar(desk.docs.sheet as never, 1, whole('A4'), 1)
    await until(() => wall.getView().chorus[1] !== undefined && desk.getView().kept === 'kept')
    expect(wall.getView().chorus).toEqual({ 1: { [student().memberId]: { notes: whole('A4'), round: 1 } } })
    adoptBars(lectern.docs.board, { 1: whole('A4') })
    await until(() => desk.getView().board?.line[1] !== undefined && lectern.getView().kept === 'kept')
    expect(desk.getView().board?.bars[1]?.state).toBe('frozen')
    expect(desk.getView().chorus).toEqual({})
  })

  it('names the class to the lectern, and to the wall only while the stage shows names', async () => {
    const [lectern, wall, desk] = [enter(lesson.teacher), enter('wall'), enter(student())]
    await until(() => lectern.getView().presence.here === 1 && wall.getView().presence.here === 1)
    expect(lectern.getView().presence.members?.map(({ name }) => name)).toEqual(['Ilse Marrow', 'Student 1'])
    expect(wall.getView().presence.members).toBeNull()
    await until(() => desk.getView().presence.here === 1)
    expect(desk.getView().presence.members).toBeNull()
    updateStage(lectern.docs.board, { showsNames: true })
    await until(() => wall.getView().presence.members !== null)
    updateStage(lectern.docs.board, { showsNames: false })
    await until(() => wall.getView().presence.members === null)
  })

  it('keeps the identity of what did not change', async () => {
    const [lectern, desk] = [enter(lesson.teacher), enter(student())]
    await until(() => isLive(lectern) && isLive(desk))
    const before = desk.getView().board
    updateStage(lectern.docs.board, { prompt: 'The cadence' })
    await until(() => desk.getView().board?.stage.prompt === 'The cadence')
    const after = desk.getView().board
    expect(after?.bars).toBe(before?.bars)
    expect(after?.exercise).toBe(before?.exercise)
    expect(after?.bars[3]).toBe(before?.bars[3])
  })

  it('holds notes written offline in the browser, and sends them from the next page', async () => {
    const storage = new MemoryStorage()
    const lectern = enter(lesson.teacher)
    const desk = enter(student(), storage)
    await until(() => isLive(lectern) && isLive(desk))
    releaseBars(lectern.docs.board, [1, 2])
    writeSheetBar(desk.docs.sheet as never, 1, whole('A4'), 1)
    await until(() => desk.getView().kept === 'kept')
    expect(storage.items.size).toBe(0)

    const offline = enter(student(), storage)
    leave(desk)
    // No server ever answers this page: it is written on and closed before it was connected.
    writeSheetBar(offline.docs.sheet as never, 2, whole('C5'), 1)
    expect(offline.getView().kept).toBe('waiting')
    expect(storage.items.size).toBe(1)
    leave(offline)

    const next = enter(student(), storage)
    expect(next.getView().sheet.notes[2]?.notes).toEqual(whole('C5'))
    await until(() => next.getView().kept === 'kept' && isLive(next))
    await until(() => lectern.getView().chorus[2] !== undefined)
    expect(Object.keys(next.getView().sheet.notes)).toEqual(['1', '2'])
    expect(storage.items.size).toBe(0)
  })

  it('gives two tabs of one member one sheet, online and off', async () => {
    const storage = new MemoryStorage()
    const [one, two] = [enter(student(), storage), enter(student(), storage)]
    const lectern = enter(lesson.teacher)
    await until(() => [one, two, lectern].every(isLive))
    await until(() => lectern.getView().presence.here === 1)
    writeSheetBar(one.docs.sheet as never, 1, whole('A4'), 1)
    await until(() => two.getView().sheet.notes[1] !== undefined)
    const [offlineOne, offlineTwo] = [enter(student(), storage), enter(student(), storage)]
    writeSheetBar(offlineOne.docs.sheet as never, 5, whole('D5'), 1)
    writeSheetBar(offlineTwo.docs.sheet as never, 6, whole('E5'), 1)
    for (const key of storage.items.keys()) offlineOne.onStorage(key)
    expect(Object.keys(offlineOne.getView().sheet.notes)).toEqual(['5', '6'])
    for (const room of [offlineOne, offlineTwo]) leave(room)
    const next = enter(student(), storage)
    await until(() => next.getView().kept === 'kept' && isLive(next))
    await until(() => Object.keys(one.getView().sheet.notes).length === 3)
    expect(Object.keys(one.getView().sheet.notes)).toEqual(['1', '5', '6'])
  })

  it('takes a removed pupil out for good and their notes off the wall', async () => {
    const [lectern, desk] = [enter(lesson.teacher), enter(student())]
    await until(() => isLive(lectern) && isLive(desk))
    releaseBars(lectern.docs.board, [1])
    writeSheetBar(desk.docs.sheet as never, 1, whole('A4'), 1)
    await until(() => lectern.getView().chorus[1] !== undefined)
    expect(await lectern.send('remove', { memberId: student().memberId })).toEqual({ ok: true })
    await until(() => desk.getView().connection === 'closed')
    expect(desk.getView().closedBecause).toBe('removed')
    await until(() => lectern.getView().chorus[1] === undefined)
    await until(() => lectern.getView().presence.members?.length === 1)
    const again = enter(student())
    await until(() => again.getView().connection === 'closed')
    expect(again.getView().closedBecause).toBe('removed')
  })

  it('raises hands and lowers them, and cues the wall alone', async () => {
    const [lectern, desk, wall] = [enter(lesson.teacher), enter(student()), enter('wall')]
    await until(() => [lectern, desk, wall].every(isLive))
    const cues: string[] = []
    wall.on('cue', ({ kind }) => cues.push(`wall ${kind}`))
    desk.on('cue', ({ kind }) => cues.push(`desk ${kind}`))
    expect(await desk.send('hand', { up: true })).toEqual({ ok: true })
    await until(() => lectern.getView().presence.hands === 1 && desk.getView().presence.hands === 1)
    expect(await lectern.send('lowerHand', { memberId: student().memberId })).toEqual({ ok: true })
    await until(() => desk.getView().presence.hands === 0)
    expect(await lectern.send('cue', { kind: 'stop' })).toEqual({ ok: true })
    await until(() => cues.length > 0)
    expect(cues).toEqual(['wall stop'])
  })

  it('tells each member of their own hand alone, whoever turned it, and again when they come back', async () => {
    const neighbour = lesson.students[1] as TestMember
    const [lectern, desk, other] = [enter(lesson.teacher), enter(student()), enter(neighbour)]
    await until(() => [lectern, desk, other].every(isLive))
    const second = enter(student())
    await until(() => isLive(second))
    for (const room of [desk, other]) expect(await room.send('hand', { up: true })).toEqual({ ok: true })
    await until(() => desk.getView().isHandUp && second.getView().isHandUp && other.getView().isHandUp)
    // Another hand is still up: the count alone would not tell.
    expect(await lectern.send('lowerHand', { memberId: student().memberId })).toEqual({ ok: true })
    await until(() => !desk.getView().isHandUp && !second.getView().isHandUp)
    expect(other.getView().isHandUp).toBe(true)
    const back = enter(neighbour)
    await until(() => isLive(back) && back.getView().isHandUp)
  })

  it('tells the lectern of newcomers gathered, and the class nothing', async () => {
    const [lectern, desk] = [enter(lesson.teacher), enter(student())]
    await until(() => isLive(lectern) && isLive(desk))
    const told: string[] = []
    lectern.on('lesson', ({ kind }) => told.push(`lectern ${kind}`))
    desk.on('lesson', ({ kind }) => told.push(`desk ${kind}`))
    for (let newcomers = 0; newcomers < 50; newcomers += 1) server.realtime.rosterChanged(lesson.lessonId)
    server.realtime.lessonChanged(lesson.lessonId)
    await until(() => told.includes('desk door') && told.includes('lectern roster'))
    expect([...told].sort()).toEqual(['desk door', 'lectern door', 'lectern roster'])
  })

  it('goes on when the storage of the browser is full', async () => {
    const forbidden: Storage = {
      getItem: () => null,
      setItem: () => {
        throw new DOMException('full', 'QuotaExceededError')
      },
      removeItem: () => {},
    }
    const desk = enter(student(), forbidden)
    await until(() => isLive(desk))
    writeSheetBar(desk.docs.sheet as never, 1, whole('A4'), 1)
    await until(() => desk.getView().kept === 'kept')
    const chorus = openDocument(server.origin, roomOf.chorus(lesson.lessonId), {
      sessionId: createId(),
      memberId: lesson.teacher.memberId,
    })
    await whenSynced(chorus)
    expect(readChorus(chorus.doc)).toEqual({})
    expect(Object.keys(readSheet(desk.docs.sheet as never).notes)).toEqual(['1'])
    chorus.close()
  })
})
