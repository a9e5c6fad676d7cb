import { chownSync, closeSync, openSync, readFileSync, rmSync, truncateSync } from 'node:fs'
import path from 'node:path'
import { setTimeout as wait } from 'node:timers/promises'
import { ClusterError } from './cluster-error'
import type { ClusterPaths } from './cluster-paths'
import { diskFull, isDiskFull } from './create-cluster'
import { findFreePort } from './find-free-port'
import { isPidOfAnother } from './process-alive'
import { runCommand } from './run-command'
import type { ServerUser } from './server-user'

const START_PATIENCE_SECONDS = 60
const START_TRIES = 5
const RETRY_MS = 500
const TOLD_LOG_LINES = 12

/** Loopback only, by password only, no socket file (whose path may be too long). */
const SETTINGS = {
  listen_addresses: '127.0.0.1',
  unix_socket_directories: '',
  max_connections: '200',
  timezone: 'UTC',
  lc_messages: 'C',
}

/** For test clusters: quicker, and safe against the end of a process, though not of the machine. */
const FORGETFUL_SETTINGS = { fsync: 'off', synchronous_commit: 'off', full_page_writes: 'off' }

/** A number that is another program's would keep the server from starting for ever. */
function removeStalePidFile(data: string): void {
  const file = path.join(data, 'postmaster.pid')
  try {
    const pid = Number(readFileSync(file, 'utf8').split('\n')[0])
    if (isPidOfAnother(pid, data)) rmSync(file, { force: true })
  } catch {
    // There is none.
  }
}

function prepareLog(log: string, user: ServerUser | null): void {
  closeSync(openSync(log, 'a', 0o600))
  truncateSync(log)
  if (user) chownSync(log, user.uid, user.gid)
}

function problemIn(log: string, data: string): ClusterError {
  if (isDiskFull(log)) return diskFull(data)
  const lines = log.trim().split('\n').slice(-TOLD_LOG_LINES).join('\n')
  if (/incompatible with (this )?server|was initialized by PostgreSQL version/i.test(log)) {
    return new ClusterError(
      'stale-cluster',
      `Stale cluster: ${data} was made by another version of PostgreSQL than the one installed. ` +
        `Install that version to go on with its data, or move the directory away to begin with an empty one.\n${lines}`,
    )
  }
  return new ClusterError('start-failed', `The database server in ${data} did not start:\n${lines}`)
}

/** Starts the server of an existing cluster and gives the port it took: `preferredPort` unless another has it. */
export async function startServer(
  binaries: string,
  paths: ClusterPaths,
  user: ServerUser | null,
  { preferredPort, isForgetful }: { preferredPort: number; isForgetful: boolean },
): Promise<number> {
  removeStalePidFile(paths.data)
  const settings = Object.entries({ ...SETTINGS, ...(isForgetful && FORGETFUL_SETTINGS) })
  let wanted = preferredPort
  for (let tries = 1; ; tries += 1) {
    const port = await findFreePort(wanted)
    prepareLog(paths.log, user)
    const options = [`-p ${port}`, ...settings.map(([key, value]) => `-c ${key}='${value}'`)].join(' ')
    const { exitCode } = await runCommand(
      path.join(binaries, 'pg_ctl'),
      ['start', '-w', '-t', String(START_PATIENCE_SECONDS), '-D', paths.data, '-l', paths.log, '-o', options],
      { user, detachOutput: true },
    )
    if (exitCode === 0) return port
    const log = readFileSync(paths.log, 'utf8')
    if (tries >= START_TRIES) throw problemIn(log, paths.data)
    // Somebody took the port between our look and the server's.
    if (/Address already in use/i.test(log)) wanted = 0
    // The children of a server that was killed notice it within moments, and end.
    else if (/pre-existing shared memory block|lock file .* already exists/i.test(log)) await wait(RETRY_MS)
    else throw problemIn(log, paths.data)
  }
}

export async function stopServer(binaries: string, data: string, user: ServerUser | null): Promise<void> {
  await runCommand(path.join(binaries, 'pg_ctl'), ['stop', '-w', '-m', 'fast', '-D', data], { user })
}
