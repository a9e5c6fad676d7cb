import { chmodSync, chownSync, mkdirSync, renameSync, rmSync, writeFileSync } from 'node:fs'
import path from 'node:path'
import { ClusterError } from './cluster-error'
import { runCommand } from './run-command'
import type { ServerUser } from './server-user'

/** Name of the database superuser; it exists on loopback and in this cluster only. */
export const CLUSTER_USER = 'bicinium'

export const isDiskFull = (text: string): boolean => /No space left on device|ENOSPC/i.test(text)

export const diskFull = (directory: string): ClusterError =>
  new ClusterError(
    'disk-full',
    `The disk that holds ${directory} is full. Make room (a few hundred megabytes) and start again; nothing that was kept is lost.`,
  )

/** Makes an empty cluster. It is made beside and renamed, so that an interrupted run leaves no half cluster behind. */
export async function createCluster(
  binaries: string,
  data: string,
  user: ServerUser | null,
  password: string,
): Promise<void> {
  const made = `${data}.new`
  const passwordFile = `${data}.password`
  try {
    rmSync(made, { recursive: true, force: true })
    mkdirSync(made, { mode: 0o700 })
    writeFileSync(passwordFile, password, { mode: 0o600 })
    chmodSync(passwordFile, 0o600)
    if (user) {
      chownSync(made, user.uid, user.gid)
      chownSync(passwordFile, user.uid, user.gid)
    }
    const { exitCode, output } = await runCommand(
      path.join(binaries, 'initdb'),
      [
        ...['-D', made, '-U', CLUSTER_USER, `--pwfile=${passwordFile}`, '--auth=scram-sha-256'],
        ...['--encoding=UTF8', '--locale=C.UTF-8', '--no-instructions', '--no-sync'],
      ],
      { user },
    )
    if (exitCode !== 0) {
      throw isDiskFull(output)
        ? diskFull(data)
        : new ClusterError(
            'initdb-failed',
            `Making the database cluster in ${data} failed:\n${output.trim()}`,
          )
    }
    renameSync(made, data)
  } catch (error) {
    rmSync(made, { recursive: true, force: true })
    if (error instanceof Error && isDiskFull(error.message)) throw diskFull(data)
    throw error
  } finally {
    rmSync(passwordFile, { force: true })
  }
}
