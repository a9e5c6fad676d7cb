import type { Logger } from 'pino'
import type { Connection } from '@/db/connect'
import { deleteAttemptsBefore } from '@/db/queries/attempts'
import { deleteExpiredInvitations } from '@/db/queries/invitations'
import { deleteExpiredLogins, deleteStaleGuests } from '@/db/queries/people'
import { deleteExpiredWallSessions } from '@/db/queries/wall-sessions'

const SWEEP_EVERY_MS = 15 * 60 * 1000
const KEEP_ATTEMPTS_MS = 24 * 60 * 60 * 1000

/** Throws away what has run out: invitations, walls, logins, guests nobody can come back as, counts of tries. */
export async function sweep(db: Connection, now: Date): Promise<void> {
  await deleteExpiredInvitations(db)
  await deleteExpiredWallSessions(db)
  await deleteExpiredLogins(db)
  await deleteStaleGuests(db)
  await deleteAttemptsBefore(db, new Date(now.getTime() - KEEP_ATTEMPTS_MS))
}

/** Sweeps now and then until told to stop. */
export function startSweeping(db: Connection, log: Logger): () => Promise<void> {
  let running: Promise<void> = Promise.resolve()
  const timer = setInterval(() => {
    running = sweep(db, new Date()).catch((error: Error) =>
      log.warn({ why: error.message }, 'sweeping failed'),
    )
  }, SWEEP_EVERY_MS)
  timer.unref()
  return async () => {
    clearInterval(timer)
    await running
  }
}
