/** The lesson's lines: one server process with the journal on, the load made here, in another process. */
import path from 'node:path'
import { createId } from '@/db/create-id'
import { startCluster } from '@/db/cluster/start-cluster'
import { DOCUMENT_PATH, roomOf } from '@/shared/wire/rooms'
import { insertTestLesson } from '@/tests/realtime/support/lesson'
import { TEST_SERVER_VARIABLE } from '@/tests/support/test-cluster'
import { createTestDatabase, type TestDatabase } from '@/tests/support/test-database'
import { startMeasured, type MeasuredProcess } from './lesson/measured-process'
import { openRaw } from './lesson/raw-client'
import { RelayLoad } from './lesson/relay-load'
import { RoomLoad, wait, writeEvenly } from './lesson/room-load'
import { percentileOf, type BenchGroup, type BenchRow } from './row'

type Tell = (progress: string) => void

/** Every phone changes something each two seconds. */
const SECONDS_BETWEEN_CHANGES = 2
const MEASURED_MS = 10_000

async function withServer<Value>(
  database: TestDatabase | null,
  work: (server: MeasuredProcess) => Promise<Value>,
): Promise<Value> {
  const server = await startMeasured(database?.url ?? null)
  try {
    return await work(server)
  } finally {
    await server.stop()
  }
}

/** What a piece of work took of the measured process: of each change, and of a core while it went on. */
async function measureCpu(
  server: MeasuredProcess,
  work: () => Promise<number>,
): Promise<Readonly<{ msAChange: number; percent: number }>> {
  const before = await server.cpuMs()
  const start = performance.now()
  const changes = await work()
  const elapsedMs = performance.now() - start
  const cpuMs = (await server.cpuMs()) - before
  return { msAChange: cpuMs / changes, percent: (100 * cpuMs) / elapsedMs }
}

async function measureR1(database: TestDatabase, tell: Tell): Promise<readonly BenchRow[]> {
  const rows: BenchRow[] = []
  for (const phones of [40, 200, 500]) {
    tell(`R1, ${phones} phones`)
    const rate = phones / SECONDS_BETWEEN_CHANGES
    const lesson = await insertTestLesson(database.db, { students: phones })
    const own = await withServer(database, async (server) => {
      const room = await RoomLoad.open(server.origin, lesson)
      await writeEvenly([room], rate, 2_000)
      room.latenciesMs = []
      const cpu = await measureCpu(server, () => writeEvenly([room], rate, MEASURED_MS))
      const { latenciesMs, missing } = room
      room.close()
      if (missing > 0) throw new Error(`${missing} changes never reached the wall`)
      return { cpu, latenciesMs }
    })
    tell(`R1, the bare relay with ${phones} phones`)
    const relay = await withServer(null, async (server) => {
      const load = await RelayLoad.open(server.origin, phones)
      const cpu = await measureCpu(server, () => load.write(rate, MEASURED_MS))
      load.close()
      return { cpu, latenciesMs: load.latenciesMs }
    })
    const isFull = phones === 500
    const row = (work: string, samples: readonly number[], unit: string, goal: string): void => {
      rows.push({ line: 'R1', work: `${phones} phones, ${rate} changes/s${work}`, samples, unit, goal })
    }
    row(': send to wall', own.latenciesMs, 'ms', isFull ? 'p95 under 50 ms' : 'reported')
    row(' on the bare relay: send to wall', relay.latenciesMs, 'ms', 'peer')
    row(': processor of the server', [own.cpu.percent], '% of a core', 'reported')
    const ratio = relay.cpu.msAChange / own.cpu.msAChange
    row(": the relay's processor time a change over ours", [ratio], '×', isFull ? '8 × or more' : 'reported')
  }
  return rows
}

async function measureR2(database: TestDatabase, tell: Tell): Promise<readonly BenchRow[]> {
  const [lessons, phones] = [50, 40]
  tell(`R2, ${lessons} lessons of ${phones} phones`)
  return withServer(database, async (server) => {
    const before = await server.memoryBytes()
    const rooms: RoomLoad[] = []
    for (let index = 0; index < lessons; index += 1) {
      const lesson = await insertTestLesson(database.db, { students: phones })
      rooms.push(await RoomLoad.open(server.origin, lesson))
    }
    const rate = (lessons * phones) / SECONDS_BETWEEN_CHANGES
    await writeEvenly(rooms, rate, 2_000)
    for (const room of rooms) room.latenciesMs = []
    const cpu = await measureCpu(server, () => writeEvenly(rooms, rate, MEASURED_MS))
    const after = await server.memoryBytes()
    const samples = rooms.flatMap(({ latenciesMs }) => latenciesMs)
    for (const room of rooms) room.close()
    const kilobytes = (after - before) / 1024 / (lessons * phones)
    const work = `${lessons} lessons of ${phones} phones, ${rate} changes/s`
    return [
      { line: 'R2', work: `${work}: send to wall`, samples, unit: 'ms', goal: 'p95 under 100 ms' },
      {
        line: 'R2',
        work: `${work}: resident memory a phone (three sockets)`,
        samples: [kilobytes],
        unit: 'KB',
        goal: 'under 60 KB',
      },
      {
        line: 'R2',
        work: `${work}: processor`,
        samples: [cpu.percent],
        unit: '% of a core',
        goal: 'reported',
      },
    ]
  })
}

async function measureR3(database: TestDatabase, tell: Tell): Promise<readonly BenchRow[]> {
  const [phones, withinMs] = [200, 5_000]
  tell(`R3, ${phones} phones join in ${withinMs / 1000} s`)
  const lesson = await insertTestLesson(database.db, { students: phones })
  const samples = await withServer(database, (server) =>
    Promise.all(
      lesson.students.map(async ({ memberId, lessonId }, index) => {
        await wait((index / phones) * withinMs)
        const start = performance.now()
        const url = `${server.origin.replace('http', 'ws')}${DOCUMENT_PATH}/${roomOf.board(lessonId)}`
        const phone = openRaw(url, { sessionId: createId(), memberId })
        await phone.synced
        const tookMs = performance.now() - start
        // It stays: the two hundredth joins a full room.
        setTimeout(() => phone.socket.terminate(), withinMs)
        return tookMs
      }),
    ),
  )
  const work = `${phones} phones join in ${withinMs / 1000} s: request to board`
  return [{ line: 'R3', work, samples, unit: 'ms', goal: 'each under 1000 ms' }]
}

async function measureR6(database: TestDatabase, tell: Tell): Promise<readonly BenchRow[]> {
  const phones = 200
  const stepMs = 4_000
  const lesson = await insertTestLesson(database.db, { students: phones })
  return withServer(database, async (server) => {
    const room = await RoomLoad.open(server.origin, lesson)
    let reached = 0
    let note = 'the load itself'
    for (let rate = 250; rate <= phones * 32; rate *= 2) {
      tell(`R6, ${rate} changes a second`)
      room.latenciesMs = []
      const { percent } = await measureCpu(server, () => writeEvenly([room], rate, stepMs))
      const p95 = percentileOf(room.latenciesMs, 0.95)
      note = `p95 ${p95.toFixed(0)} ms, ${percent.toFixed(0)} % of a core`
      if (p95 > 250 || room.missing > 0) break
      reached = rate
    }
    room.close()
    return [
      {
        line: 'R6',
        work: `${phones} phones: changes accepted until p95 passes 250 ms (last step: ${note})`,
        samples: [reached],
        unit: '/s',
        goal: 'reported',
      },
    ]
  })
}

export const runBench: BenchGroup = async (tell) => {
  const cluster = await startCluster(path.resolve('.data/bench-postgres'))
  process.env[TEST_SERVER_VARIABLE] = cluster.urlOf('postgres')
  const database = await createTestDatabase()
  try {
    const rows: BenchRow[] = []
    const only = process.env.BENCH_LINES?.split(',')
    const measures = { R1: measureR1, R2: measureR2, R3: measureR3, R6: measureR6 }
    for (const [line, measure] of Object.entries(measures)) {
      if (!only || only.includes(line)) rows.push(...(await measure(database, tell)))
    }
    return rows
  } finally {
    await database.drop()
    await cluster.release()
  }
}
