import { readFileSync } from 'node:fs'
import { ClusterError } from './cluster-error'

/** Whom the server runs as, where that is not ourselves. */
export type ServerUser = Readonly<{ name: string; uid: number; gid: number }>

const CANDIDATES = ['postgres', 'nobody']

/** PostgreSQL refuses to run as root: for root this is an unprivileged user of the system, for anybody else `null`. */
export function findServerUser(
  ownUid: number | undefined = process.getuid?.(),
  passwd: string = readFileSync('/etc/passwd', 'utf8'),
): ServerUser | null {
  if (ownUid !== 0) return null
  const users = passwd.split('\n').map((line) => line.split(':'))
  for (const candidate of CANDIDATES) {
    const [name, , uid, gid] = users.find(([user]) => user === candidate) ?? []
    if (name !== undefined && Number(uid) > 0) return { name, uid: Number(uid), gid: Number(gid) }
  }
  throw new ClusterError(
    'no-user',
    'PostgreSQL does not run as root and the system has no user `postgres` or `nobody`. Make one with: useradd --system postgres',
  )
}
