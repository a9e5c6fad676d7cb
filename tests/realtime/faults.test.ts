import { existsSync, readFileSync, rmSync } from 'node:fs'
import { randomBytes } from 'node:crypto'
import path from 'node:path'
import { sql } from 'kysely'
import * as Y from 'yjs'
import { startCluster, type Cluster } from '@/db/cluster/start-cluster'
import { ensureDatabase } from '@/db/cluster/ensure-database'
import { connect, type Connection } from '@/db/connect'
import { createId } from '@/db/create-id'
import { migrateUp } from '@/db/migrate'
import { listDocuments, listEvents } from '@/db/queries/journal'
import {
  foldEvents,
  readBoard,
  readChorus,
  readSheet,
  releaseBars,
  writeSheetBar,
  type ChorusState,
} from '@/shared/board'
import { roomOf } from '@/shared/wire/rooms'
import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import { KillableServer } from './support/killable-server'
import { insertTestLesson, type TestLesson, type TestMember } from './support/lesson'
import { startLiveServer, type LiveServer } from './support/live-server'
import { openDocument, Phone, whenSynced, type OpenDocument } from './support/phones'
import { Random } from './support/random'
import { until } from './support/until'

const SEED = 1_600
const KILLS = 20
const PITCHES = ['A4', 'B4', 'C5', 'D5', 'E5'] as const
const BARS = 11
const whole = (pitch: string) => [{ pitch, ticks: 1920 }]

/** What the journal alone says a document is. */
async function journaled(db: Connection, lessonId: string, name: string): Promise<Y.Doc> {
  const doc = new Y.Doc()
  const stored = (await listDocuments(db, lessonId)).find(({ document }) => document === name)
  if (stored?.snapshot) Y.applyUpdate(doc, stored.snapshot)
  for (const { bytes } of stored?.changes ?? []) Y.applyUpdate(doc, bytes)
  return doc
}

const sorted = (chorus: ChorusState) =>
  Object.entries(chorus).flatMap(([bar, members]) =>
    Object.entries(members)
      .map(([memberId, proposal]) => ({ bar, memberId, ...proposal }))
      .sort((a, b) => (a.memberId < b.memberId ? -1 : 1)),
  )

function openBoard(origin: string, { teacher, lessonId }: TestLesson): OpenDocument {
  return openDocument(origin, roomOf.board(lessonId), { sessionId: createId(), memberId: teacher.memberId })
}

/** Everything acknowledged to a phone is in the journal. */
async function expectAcknowledgedKept(db: Connection, phones: readonly Phone[]): Promise<void> {
  for (const { member, kept } of phones) {
    const doc = await journaled(db, member.lessonId, `sheet/${member.memberId}`)
    for (const [client, clock] of kept) expect(Y.getState(doc.store, client)).toBeGreaterThanOrEqual(clock)
  }
}

/** Sheets, chorus and events say the same, each thing once. */
async function expectWhole(db: Connection, lesson: TestLesson, phones: readonly Phone[]): Promise<void> {
  const { lessonId } = lesson
  const chorus = readChorus(await journaled(db, lessonId, 'chorus'))
  const board = readBoard(await journaled(db, lessonId, 'board'))
  for (const { member, sheet } of phones) {
    const { notes } = readSheet(sheet.doc)
    expect(readSheet(await journaled(db, lessonId, `sheet/${member.memberId}`)).notes).toEqual(notes)
    for (const [bar, written] of Object.entries(notes)) {
      expect(chorus[Number(bar)]?.[member.memberId]).toEqual(written)
    }
  }
  const told = foldEvents((await listEvents(db, lessonId)).map(({ event }) => event))
  expect(told?.board).toEqual(board)
  expect(sorted(told?.chorus ?? {})).toEqual(sorted(chorus))
}

describe('faults, with nothing acknowledged lost', () => {
  let database: TestDatabase
  const open: { close: () => void }[] = []

  beforeAll(async () => {
    console.info(`faults: seed ${SEED}`)
    database = await createTestDatabase()
  })
  afterEach(() => {
    for (const one of open.splice(0)) one.close()
  })
  afterAll(() => database?.drop())

  const enter = (origin: string, member: TestMember): Phone => {
    const phone = new Phone(origin, member)
    open.push(phone)
    return phone
  }

  it(`the server killed at ${KILLS} moments of a lesson under load`, async () => {
    const random = new Random(SEED)
    const lesson = await insertTestLesson(database.db, { students: 5 })
    const server = await KillableServer.start(database.url)
    try {
      const board = openBoard(server.origin, lesson)
      open.push(board)
      await whenSynced(board)
      releaseBars(
        board.doc,
        Array.from({ length: BARS }, (_, index) => index + 1),
      )
      const phones = lesson.students.map((member) => enter(server.origin, member))
      // A second device of the first student.
      phones.push(enter(server.origin, lesson.students[0] as TestMember))
      await until(() => phones.every(({ isReady }) => isReady))
      for (let kill = 0; kill < KILLS; kill += 1) {
        // The moment is counted in what was acknowledged, so that it falls into the work and not beside it.
        const wanted = 1 + random.below(6)
        const acknowledged = () =>
          phones.reduce((sum, { kept }) => sum + [...kept.values()].reduce(add, 0), 0)
        const goal = acknowledged() + wanted
        await until(() => {
          const phone = random.pick(phones)
          writeSheetBar(phone.sheet.doc, 1 + random.below(BARS), whole(random.pick(PITCHES)), 1)
          return acknowledged() >= goal
        }, `acknowledgements before kill ${kill}`)
        await server.kill()
        await expectAcknowledgedKept(database.db, phones)
        writeSheetBar(random.pick(phones).sheet.doc, 1 + random.below(BARS), whole(random.pick(PITCHES)), 1)
        await server.restart()
      }
      await until(() => phones.every(({ isReady, isKept }) => isReady && isKept), 'everything kept')
      await expectWhole(database.db, lesson, phones)
      expect(phones[5]?.sheet.doc.getMap('notes').toJSON()).toEqual(
        phones[0]?.sheet.doc.getMap('notes').toJSON(),
      )
    } finally {
      await server.kill()
    }
  }, 150_000)

  it('the disk full under the journal: reading goes on, it is said, and all is kept when there is room', async () => {
    const lesson = await insertTestLesson(database.db)
    const server = await startLiveServer(database.db)
    try {
      const board = openBoard(server.origin, lesson)
      open.push(board)
      await whenSynced(board)
      releaseBars(board.doc, [1, 2])
      const phone = enter(server.origin, lesson.students[0] as TestMember)
      const said: string[] = []
      phone.channel.on('keeping', (state) => said.push(state.ok ? 'ok' : state.because))
      await until(() => phone.isReady && readBoard(phone.board.doc)?.bars[1]?.state === 'released')
      await sql`
        create function refuse_full() returns trigger language plpgsql as $$
        begin raise exception 'could not extend file: No space left on device' using errcode = '53100'; end $$`.execute(
        database.db,
      )
      await sql`create trigger full_disk before insert on "journalChange" for each statement
        execute function refuse_full()`.execute(database.db)
      writeSheetBar(phone.sheet.doc, 1, whole('A4'), 1)
      await until(() => said.length > 0)
      expect(said).toEqual(['disk-full'])
      expect(phone.isKept).toBe(false)
      // Somebody new may still read; what is not kept is not shown.
      const reader = enter(server.origin, lesson.students[1] as TestMember)
      const sheet = openDocument(server.origin, roomOf.sheet(lesson.lessonId, phone.member.memberId), {
        sessionId: createId(),
        memberId: lesson.teacher.memberId,
      })
      open.push(sheet)
      await until(() => reader.board.provider.synced && sheet.provider.synced)
      expect(readBoard(reader.board.doc)?.bars[1]?.state).toBe('released')
      expect(readSheet(sheet.doc).notes).toEqual({})
      writeSheetBar(phone.sheet.doc, 2, whole('B4'), 1)
      await sql`drop trigger full_disk on "journalChange"`.execute(database.db)
      await until(() => phone.isKept && said.includes('ok'))
      await until(() => Object.keys(readSheet(sheet.doc).notes).length === 2)
      await expectWhole(database.db, lesson, [phone])
    } finally {
      await server.close()
    }
  })

  it('the database killed and gone for a while', async () => {
    const directory = path.resolve(`.data/fault-postgres-${randomBytes(4).toString('hex')}`)
    let cluster: Cluster = await startCluster(directory)
    const { dataDirectory } = cluster
    await ensureDatabase(cluster.urlOf('postgres'), 'faults')
    const db = connect(cluster.urlOf('faults'))
    let server: LiveServer | null = null
    try {
      await migrateUp(db)
      const lesson = await insertTestLesson(db)
      server = await startLiveServer(db)
      const board = openBoard(server.origin, lesson)
      open.push(board)
      await whenSynced(board)
      releaseBars(board.doc, [1, 2, 3, 4])
      const phones = lesson.students.map((member) => enter((server as LiveServer).origin, member))
      const said: string[] = []
      phones[0]?.channel.on('keeping', (state) => said.push(state.ok ? 'ok' : state.because))
      await until(() => phones.every(({ isReady }) => isReady))
      for (const { sheet } of phones) writeSheetBar(sheet.doc, 1, whole('A4'), 1)
      await until(() => phones.every(({ isKept }) => isKept))

      const postmaster = Number(
        readFileSync(path.join(dataDirectory, 'postmaster.pid'), 'utf8').split('\n')[0],
      )
      for (const { sheet } of phones) writeSheetBar(sheet.doc, 2, whole('B4'), 1)
      process.kill(postmaster, 'SIGKILL')
      for (const { sheet } of phones) writeSheetBar(sheet.doc, 3, whole('C5'), 1)
      await until(() => said.includes('database'))
      expect(phones.every(({ isKept }) => !isKept)).toBe(true)
      expect(phones.every(({ sheet }) => sheet.provider.wsconnected)).toBe(true)
      for (const { sheet } of phones) writeSheetBar(sheet.doc, 4, whole('D5'), 1)

      await until(async () => {
        try {
          cluster = await startCluster(directory)
          return true
        } catch {
          // The dead server's children are still letting go of its memory.
          return false
        }
      })
      await expectAcknowledgedKept(db, phones)
      await until(() => phones.every(({ isKept }) => isKept) && said.includes('ok'))
      await expectWhole(db, lesson, phones)
    } finally {
      for (const one of open.splice(0)) one.close()
      await server?.close()
      await db.destroy()
      await cluster.release()
      if (existsSync(dataDirectory)) rmSync(dataDirectory, { recursive: true, force: true })
      for (const end of ['.json', '.log', '.lock'])
        rmSync(`${dataDirectory}${end}`, { recursive: true, force: true })
    }
  }, 90_000)

  it('a phone that was offline, a wall that came back a hundred times, and everything let go afterwards', async () => {
    const lesson = await insertTestLesson(database.db)
    const server = await startLiveServer(database.db, { graceMs: 1 })
    try {
      const board = openBoard(server.origin, lesson)
      const phone = enter(server.origin, lesson.students[0] as TestMember)
      open.push(board)
      await whenSynced(board)
      await until(() => phone.isReady)
      releaseBars(board.doc, [1, 2])
      phone.goOffline()
      writeSheetBar(phone.sheet.doc, 1, whole('A4'), 1)
      expect(phone.isKept).toBe(false)
      const wallCookie = { sessionId: createId(), wallOf: lesson.lessonId }
      const wall = openDocument(server.origin, roomOf.chorus(lesson.lessonId), wallCookie)
      open.push(wall)
      for (let times = 0; times < 100; times += 1) {
        await whenSynced(wall)
        wall.provider.disconnect()
        wall.provider.connect()
      }
      phone.comeBack()
      await until(() => phone.isKept)
      await until(() => readChorus(wall.doc)[1] !== undefined)
      await expectWhole(database.db, lesson, [phone])
      for (const one of open.splice(0)) one.close()
      const connections = () =>
        new Promise<number>((resolve) => server.httpServer.getConnections((_, count) => resolve(count)))
      await until(async () => (await connections()) === 0)
      // The room is gone from memory, and its documents are whole in the journal, without their single changes.
      await until(async () => {
        const stored = await listDocuments(database.db, lesson.lessonId)
        return (
          stored.length === 3 && stored.every(({ snapshot, changes }) => snapshot && changes.length === 0)
        )
      })
      const again = enter(server.origin, lesson.students[0] as TestMember)
      await until(() => again.isReady)
      expect(readSheet(again.sheet.doc)).toEqual(readSheet(phone.sheet.doc))
    } finally {
      await server.close()
    }
  })
})

const add = (a: number, b: number): number => a + b
