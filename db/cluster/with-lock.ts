import { mkdirSync, readFileSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { ClusterError } from './cluster-error'
import { isProcessAlive } from './process-alive'

const POLL_MS = 100
const PATIENCE_MS = 120_000

function holderOf(lock: string): number | null {
  try {
    return Number(readFileSync(path.join(lock, 'pid'), 'utf8'))
  } catch {
    return null
  }
}

/**
 * Does `work` while no other process is at it: making a directory succeeds for one only. A lock whose holder is dead is
 * taken away.
 */
export async function withLock<Value>(lock: string, work: () => Promise<Value>): Promise<Value> {
  const deadline = Date.now() + PATIENCE_MS
  for (let polls = 0; ; polls += 1) {
    try {
      mkdirSync(lock)
      break
    } catch (error) {
      if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
    }
    const holder = holderOf(lock)
    // A lock without a number is one just being made, unless it stays so.
    if (holder === null ? polls > 20 : !isProcessAlive(holder)) rmSync(lock, { recursive: true, force: true })
    else if (Date.now() > deadline) {
      throw new ClusterError(
        'locked',
        `Another process (${holder}) has been starting the database for too long. If there is none, remove ${lock}.`,
      )
    } else await wait(POLL_MS)
  }
  try {
    writeFileSync(path.join(lock, 'pid'), String(process.pid))
    return await work()
  } finally {
    rmSync(lock, { recursive: true, force: true })
  }
}
