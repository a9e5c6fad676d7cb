import { readdirSync, readFileSync, readlinkSync } from 'node:fs'

export function isProcessAlive(pid: number): boolean {
  try {
    process.kill(pid, 0)
    return true
  } catch (error) {
    return (error as NodeJS.ErrnoException).code === 'EPERM'
  }
}

/** Whether any process works in a directory, as every process of a PostgreSQL server does in its data directory. */
function isWorkedIn(directory: string): boolean {
  return readdirSync('/proc').some((entry) => {
    try {
      return /^\d+$/.test(entry) && readlinkSync(`/proc/${entry}/cwd`) === directory
    } catch {
      return false
    }
  })
}

/**
 * Whether a process number that a server left behind is another program's now, as after a restart of the machine. A number
 * that is nobody's, and a server that was killed while its children live, are for PostgreSQL's own check to judge.
 */
export function isPidOfAnother(pid: number, dataDirectory: string): boolean {
  if (!isProcessAlive(pid)) return false
  try {
    return !readFileSync(`/proc/${pid}/cmdline`, 'utf8').includes('postgres') && !isWorkedIn(dataDirectory)
  } catch {
    // A system without /proc tells us nothing.
    return false
  }
}
