import { readFileSync } from 'node:fs'

export function isProcessAlive(pid: number): boolean {
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM'
  }
}

/** Whether a process number belongs to a PostgreSQL server now. After a restart of the machine it may be anyone's. */
export function isServerProcess(pid: number): boolean {
  if (!isProcessAlive(pid)) return false
  try {
    return readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('postgres')
  } catch {
    // A system without /proc: leave it to the server's own check.
    return true
  }
}
