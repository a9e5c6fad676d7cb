import { existsSync, readdirSync } from 'node:fs'
import path from 'node:path'
import { ClusterError } from './cluster-error'

const DEBIAN_ROOT = '/usr/lib/postgresql'
const OTHER_DIRECTORIES = ['/usr/pgsql/bin', '/usr/local/pgsql/bin', '/usr/local/bin', '/usr/bin']
const NEEDED = ['initdb', 'pg_ctl', 'postgres']

export type ServerBinaries = Readonly<{ directory: string; major: number | null }>

const holdsServer = (directory: string) => NEEDED.every((name) => existsSync(path.join(directory, name)))

/** The installed servers, newest first. Debian keeps each major version in its own directory and none on the path. */
export function listServerBinaries(debianRoot = DEBIAN_ROOT): readonly ServerBinaries[] {
  const majors = existsSync(debianRoot) ? readdirSync(debianRoot).map(Number).filter(Number.isInteger) : []
  const debian = majors
    .sort((a, b) => b - a)
    .map((major) => ({ directory: path.join(debianRoot, String(major), 'bin'), major }))
  const others = OTHER_DIRECTORIES.map((directory) => ({ directory, major: null }))
  return [...debian, ...others].filter(({ directory }) => holdsServer(directory))
}

/** The server to run a cluster with: the newest, or for a cluster that exists the one of its own major version. */
export function findServerBinaries(
  clusterMajor: number | null,
  clusterDirectory: string,
  installed: readonly ServerBinaries[] = listServerBinaries(),
): ServerBinaries {
  const [newest] = installed
  if (!newest) {
    throw new ClusterError(
      'no-server',
      'No PostgreSQL server is installed. Install it with: apt-get install -y postgresql (or set DATABASE_URL to a server of yours).',
    )
  }
  if (clusterMajor === null) return newest
  const fitting = installed.find(({ major }) => major === clusterMajor)
  if (fitting) return fitting
  if (newest.major === null) return newest
  throw new ClusterError(
    'stale-cluster',
    `Stale cluster: ${clusterDirectory} was made by PostgreSQL ${clusterMajor}, but only PostgreSQL ${newest.major} is installed. ` +
      `Install postgresql-${clusterMajor} to go on with its data, or move the directory away to begin with an empty one.`,
  )
}
