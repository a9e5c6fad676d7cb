import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import { readBoard, readChorus, readSheet, releaseBars, freezeBars, writeSheetBar } from '@/shared/board'
import { roomOf } from '@/shared/wire/rooms'
import { createId } from '@/db/create-id'
import { insertTestLesson, type TestLesson } from './support/lesson'
import { startLiveServer, type LiveServer } from './support/live-server'
import { openDocument, Phone, whenSynced, type OpenDocument } from './support/phones'
import { until } from './support/until'

const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

describe('a lesson over real sockets and a real database', () => {
  let database: TestDatabase
  let server: LiveServer
  let lesson: TestLesson
  const open: { close: () => void }[] = []

  beforeAll(async () => {
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

  const phone = (index = 0, to = server): Phone => {
    const made = new Phone(to.origin, lesson.students[index] as TestLesson['teacher'])
    open.push(made)
    return made
  }
  const lectern = async (to = server): Promise<{ board: OpenDocument; chorus: OpenDocument }> => {
    const cookie = { sessionId: createId(), memberId: lesson.teacher.memberId }
    const board = openDocument(to.origin, roomOf.board(lesson.lessonId), cookie)
    const chorus = openDocument(to.origin, roomOf.chorus(lesson.lessonId), cookie)
    open.push(board, chorus)
    await whenSynced(board)
    await whenSynced(chorus)
    return { board, chorus }
  }

  it('carries a note in a released bar to the chorus, and says that it is kept', async () => {
    const { board, chorus } = await lectern()
    const student = phone()
    releaseBars(board.doc, [1])
    await until(() => readBoard(student.board.doc)?.bars[1]?.state === 'released')
    writeSheetBar(student.sheet.doc, 1, whole('A4'), 1)
    await until(() => readChorus(chorus.doc)[1]?.[student.member.memberId] !== undefined)
    await until(() => student.isKept)
    expect(readChorus(chorus.doc)).toEqual({
      1: { [student.member.memberId]: { notes: whole('A4'), round: 1 } },
    })
  })

  it('keeps a note in a frozen bar as a draft, and carries it when the bar is released', async () => {
    const { board, chorus } = await lectern()
    const student = phone()
    releaseBars(board.doc, [2])
    writeSheetBar(student.sheet.doc, 1, whole('A4'), 1)
    writeSheetBar(student.sheet.doc, 2, whole('D5'), 1)
    await until(() => readChorus(chorus.doc)[2]?.[student.member.memberId] !== undefined)
    expect(readChorus(chorus.doc)[1]).toBeUndefined()
    freezeBars(board.doc, [2])
    await until(() => readBoard(student.board.doc)?.bars[2]?.state === 'frozen')
    writeSheetBar(student.sheet.doc, 2, whole('C5'), 1)
    await until(() => student.isKept)
    expect(readChorus(chorus.doc)[2]?.[student.member.memberId]?.notes).toEqual(whole('D5'))
    releaseBars(board.doc, [1, 2])
    await until(() => readChorus(chorus.doc)[2]?.[student.member.memberId]?.notes[0]?.pitch === 'C5')
    expect(readChorus(chorus.doc)[1]?.[student.member.memberId]?.notes).toEqual(whole('A4'))
  })

  it('restores every document exactly on another server', async () => {
    const { board } = await lectern()
    const students = [phone(0), phone(1)]
    releaseBars(board.doc, [1, 2, 3])
    for (const bar of [1, 2, 3]) {
      for (const student of students) writeSheetBar(student.sheet.doc, bar, whole(`${'ABC'[bar - 1]}4`), 1)
    }
    await until(() => students.every(({ isKept, isReady }) => isReady && isKept))
    const other = await startLiveServer(database.db)
    try {
      const there = await lectern(other)
      expect(readBoard(there.board.doc)).toEqual(readBoard(board.doc))
      expect(Object.keys(readChorus(there.chorus.doc)[3] ?? {})).toHaveLength(2)
      const sheet = openDocument(
        other.origin,
        roomOf.sheet(lesson.lessonId, lesson.students[0]?.memberId as string),
        { sessionId: createId(), memberId: lesson.students[0]?.memberId as string },
      )
      open.push(sheet)
      await whenSynced(sheet)
      expect(readSheet(sheet.doc)).toEqual(readSheet(students[0]?.sheet.doc as never))
    } finally {
      await other.close()
    }
  })
})
