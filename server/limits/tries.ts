/** How many tries at a secret one may fail within a span before one has to wait; each wait in a row is twice as long. */
export type TryPolicy = Readonly<{ tries: number; windowMs: number; lockMs: number; maxLockMs: number }>

export type TryCount = Readonly<{
  failures: number
  windowStartedAt: Date
  lockedUntil: Date | null
  locks: number
}>

/** Good behaviour for so long forgets earlier locks. */
const FORGET_LOCKS_MS = 24 * 60 * 60 * 1000

/** Milliseconds for which nothing will be tried, 0 when one may. */
export const lockedForMs = (count: TryCount | null | undefined, now: Date): number =>
  Math.max(0, (count?.lockedUntil?.getTime() ?? 0) - now.getTime())

/** The failures that still count: none once the window or a lock has run out. */
export const failuresNow = (
  count: TryCount | null | undefined,
  { windowMs }: TryPolicy,
  now: Date,
): number =>
  count && !count.lockedUntil && now.getTime() - count.windowStartedAt.getTime() < windowMs
    ? count.failures
    : 0

/** Counts one more failure. The failure that makes the number full locks. While locked nothing is counted. */
export function countFailure(count: TryCount | null | undefined, policy: TryPolicy, now: Date): TryCount {
  if (count && lockedForMs(count, now) > 0) return count
  const earlier = failuresNow(count, policy, now)
  const failures = earlier + 1
  const sinceMs = count ? now.getTime() - count.windowStartedAt.getTime() : Infinity
  const locks = sinceMs > FORGET_LOCKS_MS ? 0 : (count?.locks ?? 0)
  const windowStartedAt = earlier > 0 && count ? count.windowStartedAt : now
  if (failures < policy.tries) return { failures, windowStartedAt, lockedUntil: null, locks }
  const lockMs = Math.min(policy.maxLockMs, policy.lockMs * 2 ** locks)
  return { failures, windowStartedAt, lockedUntil: new Date(now.getTime() + lockMs), locks: locks + 1 }
}
