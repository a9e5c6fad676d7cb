/** Coming up again: `npm start` where everything is installed and built. The first start, all downloads, is timed by hand. */
import { spawn } from 'node:child_process'
import { once } from 'node:events'
import { mkdtemp, rm } from 'node:fs/promises'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { findFreePort } from '@/db/cluster/find-free-port'
import type { BenchGroup } from './row'

const STARTS = 5
const READY = 'Bicinium is ready'

/** Milliseconds from the command to the printed address; the server is then stopped as Ctrl-C stops it. */
async function start(dataDirectory: string): Promise<number> {
  const port = await findFreePort()
  const startedMs = performance.now()
  const child = spawn('npm', ['start'], {
    env: {
      ...process.env,
      PORT: String(port),
      DATA_DIRECTORY: dataDirectory,
      DATABASE_URL: '',
      LOG_LEVEL: 'warn',
    },
    stdio: ['ignore', 'pipe', 'pipe'],
    // A group of its own, so that a signal reaches what npm started, as a terminal's does.
    detached: true,
  })
  const ended = once(child, 'exit')
  let told = ''
  const ready = new Promise<number>((resolve, reject) => {
    const listen = (chunk: Buffer): void => {
      told += chunk.toString()
      if (told.includes(READY)) resolve(performance.now() - startedMs)
    }
    child.stdout.on('data', listen)
    child.stderr.on('data', listen)
    child.on('exit', () => reject(new Error(`It ended before it was ready:\n${told}`)))
  })
  try {
    return await ready
  } finally {
    if (child.exitCode === null && child.pid !== undefined) process.kill(-child.pid, 'SIGINT')
    await ended
  }
}

export const runBench: BenchGroup = async (tell) => {
  // A place of its own: the demo that a person may have running beside is left alone.
  const home = await mkdtemp(path.join(tmpdir(), 'bicinium-start-'))
  try {
    tell('the first start makes the cluster; it is not counted')
    await start(home)
    const samples: number[] = []
    for (let count = 1; count <= STARTS; count += 1) {
      tell(`O2: start ${count} of ${STARTS}`)
      samples.push(await start(home))
    }
    return [
      { line: 'O2', work: 'second `npm start`, to the printed address', samples, unit: 'ms', goal: 'under 5000 ms' },
    ] // prettier-ignore
  } finally {
    await rm(home, { recursive: true, force: true })
  }
}
