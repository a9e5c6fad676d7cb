import { spawn, type ChildProcess } from 'node:child_process'
import { once } from 'node:events'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { findFreePort } from '@/db/cluster/find-free-port'
import { demo } from '@/shared/api/demo'
import { createTestDatabase } from '@/tests/support/test-database'

const ENTRY = 'server/main.ts'
const PATIENCE_MS = 45_000
const POLL_MS = 50

export type Person = Readonly<{ name: string; email: string; role: string }>

/** A school of its own: the real server in a process of its own, on a fresh database with the demo's people in it. */
export type School = Readonly<{
  origin: string
  databaseUrl: string
  /** Every demo person's password. */
  password: string
  people: readonly Person[]
  /** Ends the server as a power cut would: no goodbye, nothing flushed. */
  kill: () => Promise<void>
  /** Brings the server up again, on the same port and database. */
  restart: () => Promise<void>
  /** Number of the server's process, for measuring. */
  pid: () => number
  close: () => Promise<void>
}>

/** Needs the cluster of `tests/support`, which jest's set-up starts. */
export async function openSchool(environment: Readonly<Record<string, string>> = {}): Promise<School> {
  const database = await createTestDatabase()
  const dataDirectory = await mkdtemp(path.join(tmpdir(), 'bicinium-school-'))
  const port = await findFreePort()
  const origin = `http://localhost:${port}`
  let server: ChildProcess | null = null
  let told = ''

  async function start(): Promise<void> {
    told = ''
    const child = spawn(process.execPath, ['--import', 'tsx', ENTRY], {
      env: {
        ...process.env,
        PORT: String(port),
        HOST: '127.0.0.1',
        PUBLIC_URL: origin,
        DATABASE_URL: database.url,
        DATA_DIRECTORY: dataDirectory,
        AUTH_SECRET: 'a secret for tests alone, of no use elsewhere',
        DEMO: '1',
        LOG_LEVEL: 'warn',
        NODE_ENV: 'production',
        ...environment,
      },
      stdio: ['ignore', 'pipe', 'pipe'],
    })
    for (const stream of [child.stdout, child.stderr]) stream.on('data', (chunk) => (told += String(chunk)))
    server = child
    // A server that ends by itself explains every failure after it.
    child.on('exit', (exitCode, signal) => {
      if (server === child) console.error(`The server ended by itself (${signal ?? exitCode}):\n${told}`)
    })
    const deadlineMs = Date.now() + PATIENCE_MS
    while (!(await isUp(origin))) {
      if (child.exitCode !== null) throw new Error(`The server ended while it started:\n${told}`)
      if (Date.now() > deadlineMs) throw new Error(`The server did not answer in time:\n${told}`)
      await wait(POLL_MS)
    }
  }

  async function end(signal: 'SIGKILL' | 'SIGTERM'): Promise<void> {
    const child = server
    server = null
    if (!child || child.exitCode !== null || child.signalCode !== null) return
    const ended = once(child, 'exit')
    child.kill(signal)
    await ended
  }

  async function close(): Promise<void> {
    await end('SIGTERM')
    await database.drop()
    await rm(dataDirectory, { recursive: true, force: true })
  }

  try {
    await start()
    const response = await fetch(origin + demo.people.path)
    const { password, people } = demo.people.reply.parse(await response.json())
    return {
      origin,
      databaseUrl: database.url,
      password,
      people,
      kill: () => end('SIGKILL'),
      restart: start,
      pid: () => server?.pid as number,
      close,
    }
  } catch (error) {
    await close()
    throw error
  }
}

const isUp = (origin: string): Promise<boolean> =>
  fetch(`${origin}/api/me`).then(
    (response) => response.ok,
    () => false,
  )
