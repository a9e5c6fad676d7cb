import { createHash } from 'node:crypto'
import type { Connection } from '@/db/connect'
import { deleteAttempt, findAttempt, upsertAttempt } from '@/db/queries/attempts'
import { createKeyedQueue } from './keyed-queue'
import { POLICIES } from './policies'
import { countFailure, failuresNow, lockedForMs, type TryPolicy } from './tries'

/** Requests of one key that may wait for their turn; a class at the door is some hundreds. */
const MOST_WAITING = 1_000
const CROWDED_MS = 5_000

const hashed = (text: string) => createHash('sha256').update(text).digest('base64url').slice(0, 32)

export type Limits = ReturnType<typeof createLimits>

/** Counts of tries, kept in the database. Every act answers with the milliseconds one has to wait, or 0. */
export function createLimits(db: Connection, now: () => Date = () => new Date()) {
  const inTurn = createKeyedQueue(MOST_WAITING)

  /** Counts a try before its outcome is known, so that a burst cannot slip through; success takes it back. */
  async function count(key: string, policy: TryPolicy): Promise<number> {
    const waitMs = await inTurn(key, async () => {
      const attempt = await findAttempt(db, key)
      const lockMs = lockedForMs(attempt, now())
      if (lockMs > 0) return lockMs
      await upsertAttempt(db, { key, ...countFailure(attempt, policy, now()) })
      return 0
    })
    return waitMs === 'crowded' ? CROWDED_MS : waitMs
  }

  const signInKeys = (email: string, source: string) => ({
    account: `sign-in:${hashed(email)}`,
    pair: `sign-in:${hashed(email)}:${hashed(source)}`,
  })

  return {
    async takeSignIn(email: string, source: string): Promise<number> {
      const { account, pair } = signInKeys(email, source)
      return (await count(pair, POLICIES.signInFromSource)) || count(account, POLICIES.signIn)
    },
    async forgiveSignIn(email: string, source: string): Promise<void> {
      const { account, pair } = signInKeys(email, source)
      await deleteAttempt(db, pair)
      await deleteAttempt(db, account)
    },
    async takeMail(email: string, source: string): Promise<number> {
      return (
        (await count(`mail-from:${hashed(source)}`, POLICIES.mailFrom)) ||
        count(`mail-to:${hashed(email)}`, POLICIES.mailTo)
      )
    },
    takeInvitation: (courseId: string): Promise<number> => count(`invite:${courseId}`, POLICIES.invite),
    /**
     * Looks a lesson code up in turn with the others of the same source. Codes that lead nowhere are counted; right ones
     * are not, so that a class behind one address gets in.
     */
    async tryCode<Found>(
      source: string,
      look: () => Promise<Found | undefined>,
    ): Promise<{ found: Found | undefined; waitMs: number }> {
      const key = `code:${hashed(source)}`
      const outcome = await inTurn(key, async () => {
        const [mine, everybodys] = await Promise.all([findAttempt(db, key), findAttempt(db, 'code')])
        const waitMs = lockedForMs(mine, now())
        if (waitMs > 0) return { found: undefined, waitMs }
        const found = await look()
        if (found === undefined) {
          const isAttacked =
            lockedForMs(everybodys, now()) > 0 ||
            failuresNow(everybodys, POLICIES.codeOverall, now()) >= POLICIES.codeOverall.tries
          const policy = isAttacked ? POLICIES.codeUnderAttack : POLICIES.codeFromSource
          await upsertAttempt(db, { key, ...countFailure(mine, policy, now()) })
          await count('code', POLICIES.codeOverall)
        }
        return { found, waitMs: 0 }
      })
      return outcome === 'crowded' ? { found: undefined, waitMs: CROWDED_MS } : outcome
    },
  } as const
}
