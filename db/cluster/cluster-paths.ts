import { createHash } from 'node:crypto'
import { chmodSync, chownSync, mkdirSync } from 'node:fs'
import { tmpdir } from 'node:os'
import path from 'node:path'
import { runCommand } from './run-command'
import type { ServerUser } from './server-user'

export type ClusterPaths = Readonly<{
  /** The server's data directory. */
  data: string
  log: string
  /** Port, password and keepers. */
  state: string
  lock: string
}>

const pathsIn = (home: string, name: string): ClusterPaths => ({
  data: path.join(home, name),
  log: path.join(home, `${name}.log`),
  state: path.join(home, `${name}.json`),
  lock: path.join(home, `${name}.lock`),
})

function makeHome(home: string, user: ServerUser | null): void {
  mkdirSync(home, { recursive: true })
  // The server's user has to pass through; what is secret in here has a mode of its own.
  if (user) chmodSync(home, 0o755)
}

/**
 * Where a cluster lives: beside the project, unless the server's user cannot get there (a checkout under `/root`), and
 * then in a directory of the system's for lasting temporary files.
 */
export async function prepareClusterPaths(directory: string, user: ServerUser | null): Promise<ClusterPaths> {
  const name = path.basename(directory)
  const home = path.dirname(path.resolve(directory))
  makeHome(home, user)
  if (!user) return pathsIn(home, name)
  const { exitCode } = await runCommand('/usr/bin/test', ['-x', home], { user })
  if (exitCode === 0) return pathsIn(home, name)
  const hash = createHash('sha256').update(home).digest('hex').slice(0, 12)
  const elsewhere = path.join(process.platform === 'linux' ? '/var/tmp' : tmpdir(), `bicinium-${hash}`)
  makeHome(elsewhere, user)
  chownSync(elsewhere, 0, 0)
  return pathsIn(elsewhere, name)
}
