import { spawn } from 'node:child_process'
import {
  chmodSync,
  existsSync,
  mkdirSync,
  mkdtempSync,
  readdirSync,
  readFileSync,
  rmSync,
  statSync,
  writeFileSync,
} from 'node:fs'
import { createServer } from 'node:net'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { Client } from 'pg'
import { ensureDatabase } from '@/db/cluster/ensure-database'
import { findServerBinaries, listServerBinaries } from '@/db/cluster/server-binaries'
import { findServerUser } from '@/db/cluster/server-user'
import { startCluster, type Cluster } from '@/db/cluster/start-cluster'

let home: string
let directory: string
const clusters: Cluster[] = []
/** Directories beside `home` to clear away. */
const litter: string[] = []
const start = async () => {
  const cluster = await startCluster(directory, { isForgetful: true })
  clusters.push(cluster)
  return cluster
}

beforeEach(() => {
  home = mkdtempSync(path.join(tmpdir(), 'bicinium-cluster-'))
  directory = path.join(home, 'postgres')
})
afterEach(async () => {
  for (const cluster of clusters.splice(0)) await cluster.release()
  for (const place of [home, ...litter.splice(0)]) rmSync(place, { recursive: true, force: true })
})

const answers = async (url: string): Promise<boolean> => {
  const client = new Client({ connectionString: url })
  client.on('error', () => {})
  return client.connect().then(
    () => client.end().then(() => true),
    () => false,
  )
}

const majorHere = () => listServerBinaries()[0]?.major ?? 0

describe('the cluster', () => {
  it('is made, answers by its password only, on loopback only, and is started again with what it held', async () => {
    const first = await start()
    expect(first.wasStarted).toBe(true)
    await ensureDatabase(first.urlOf('postgres'), 'kept')
    await ensureDatabase(first.urlOf('postgres'), 'kept')
    expect(await answers(first.urlOf('kept'))).toBe(true)
    const wrong = new URL(first.urlOf('kept'))
    wrong.password = 'not-this'
    expect(await answers(wrong.href)).toBe(false)
    const client = new Client({ connectionString: first.urlOf('kept') })
    await client.connect()
    const { rows } = await client.query('show listen_addresses')
    expect(rows).toEqual([{ listen_addresses: '127.0.0.1' }])
    await client.end()

    await first.release()
    expect(await answers(first.urlOf('kept'))).toBe(false)
    const second = await start()
    expect(second.port).toBe(first.port)
    expect(await answers(second.urlOf('kept'))).toBe(true)
  })

  it('keeps its password to its owner', async () => {
    await start()
    expect(statSync(path.join(home, 'postgres.json')).mode & 0o077).toBe(0)
    expect(statSync(directory).mode & 0o077).toBe(0)
    expect(readdirSync(home).filter((file) => file.includes('password'))).toEqual([])
  })

  it('is made once when several start it at the same time, and stops with the last of them', async () => {
    const [one, two, three] = await Promise.all([start(), start(), start()])
    expect([one, two, three].filter((cluster) => cluster?.wasStarted)).toHaveLength(1)
    expect(new Set([one?.port, two?.port, three?.port]).size).toBe(1)
  })

  it('runs on while another process uses it', async () => {
    const cluster = await start()
    const other = spawn(process.execPath, ['-e', 'process.stdin.resume()'], {
      stdio: ['pipe', 'ignore', 'ignore'],
    })
    const file = path.join(home, 'postgres.json')
    const state = JSON.parse(readFileSync(file, 'utf8')) as { keepers: number[] }
    writeFileSync(file, JSON.stringify({ ...state, keepers: [...state.keepers, other.pid] }))
    await cluster.release()
    expect(await answers(cluster.urlOf('postgres'))).toBe(true)
    const ended = new Promise((resolve) => other.once('exit', resolve))
    other.stdin?.end()
    await ended
    await cluster.release()
    expect(await answers(cluster.urlOf('postgres'))).toBe(false)
  })

  it('takes another port when its own is taken, and remembers it', async () => {
    const first = await start()
    await first.release()
    const squatter = createServer()
    await new Promise<void>((resolve) => squatter.listen(first.port, '127.0.0.1', resolve))
    const second = await start()
    expect(second.port).not.toBe(first.port)
    await second.release()
    await new Promise((resolve) => squatter.close(resolve))
    expect((await start()).port).toBe(second.port)
  })

  it('starts after a kill that left its number behind, even when that number is another program’s now', async () => {
    const first = await start()
    const pidFile = path.join(directory, 'postmaster.pid')
    const left = readFileSync(pidFile, 'utf8')
    await first.release()
    writeFileSync(pidFile, left.replace(/^\d+/, String(process.pid)))
    expect((await start()).wasStarted).toBe(true)
  })

  it('begins anew after an interrupted making', async () => {
    mkdirSync(path.join(home, 'postgres.new'))
    writeFileSync(path.join(home, 'postgres.new', 'half'), 'made')
    const cluster = await start()
    expect(existsSync(path.join(home, 'postgres.new'))).toBe(false)
    expect(await answers(cluster.urlOf('postgres'))).toBe(true)
  })

  it('lives elsewhere where the server’s user cannot get to the project, and is found there again', async () => {
    chmodSync(home, 0o700)
    directory = path.join(home, 'inner', 'postgres')
    const first = await start()
    const isElsewhere = !first.dataDirectory.startsWith(home)
    expect(isElsewhere).toBe(process.getuid?.() === 0)
    await first.release()
    const second = await start()
    expect(second.dataDirectory).toBe(first.dataDirectory)
    if (isElsewhere) litter.push(path.dirname(first.dataDirectory))
  })

  it('of another version is called stale, with what to do', async () => {
    await (await start()).release()
    writeFileSync(path.join(directory, 'PG_VERSION'), '9\n')
    await expect(startCluster(directory)).rejects.toMatchObject({
      code: 'stale-cluster',
      message: expect.stringMatching(/Stale cluster.*PostgreSQL 9.*move the directory away/s),
    })
  })

  it('without its password is called stale, with what to do', async () => {
    await (await start()).release()
    rmSync(path.join(home, 'postgres.json'))
    await expect(startCluster(directory)).rejects.toMatchObject({ code: 'stale-cluster' })
  })
})

describe('what the cluster needs', () => {
  it('is said where it is missing', () => {
    expect(() => findServerBinaries(null, directory, [])).toThrow(/apt-get install -y postgresql/)
    const passwd = 'root:x:0:0::/root:/bin/sh\n'
    expect(() => findServerUser(0, passwd)).toThrow(/useradd/)
  })

  it('is the server of the cluster’s own version where there are several', () => {
    const installed = [
      { directory: '/new', major: majorHere() + 1 },
      { directory: '/old', major: majorHere() },
    ]
    expect(findServerBinaries(majorHere(), directory, installed).directory).toBe('/old')
    expect(findServerBinaries(null, directory, installed).directory).toBe('/new')
  })

  it('is never root', () => {
    const passwd =
      'root:x:0:0::/root:/bin/sh\npostgres:x:101:104::/:/bin/sh\nnobody:x:65534:65534::/:/bin/sh\n'
    expect(findServerUser(0, passwd)).toEqual({ name: 'postgres', uid: 101, gid: 104 })
    expect(findServerUser(1000, passwd)).toBeNull()
  })
})
