import type { TryPolicy } from './tries'

const MINUTE_MS = 60 * 1000
const HOUR_MS = 60 * MINUTE_MS

/**
 * What may be tried how often. A class sits behind one address, so an address alone never locks anybody out of their
 * account: sign-in counts by account, and by account and address together.
 */
export const POLICIES = {
  /** Wrong passwords for one account from one address. */
  signInFromSource: { tries: 10, windowMs: 15 * MINUTE_MS, lockMs: 15 * MINUTE_MS, maxLockMs: 4 * HOUR_MS },
  /** Wrong passwords for one account from anywhere: guessing spread over many addresses. */
  signIn: { tries: 50, windowMs: HOUR_MS, lockMs: 15 * MINUTE_MS, maxLockMs: HOUR_MS },
  /** Messages that anybody may have sent to one address: verification, reset, sign-up. */
  mailTo: { tries: 6, windowMs: HOUR_MS, lockMs: HOUR_MS, maxLockMs: HOUR_MS },
  /** The same from one source; a whole school signs up in one morning. */
  mailFrom: { tries: 400, windowMs: HOUR_MS, lockMs: 30 * MINUTE_MS, maxLockMs: 2 * HOUR_MS },
  /** Invitations of one course. */
  invite: { tries: 1_000, windowMs: 24 * HOUR_MS, lockMs: HOUR_MS, maxLockMs: 6 * HOUR_MS },
  /**
   * Lesson codes that lead nowhere, by source. There are 7⁶ = 117 649 codes: at thirty in ten minutes, with waits that
   * double, one source gets through some 400 in a day.
   */
  codeFromSource: { tries: 30, windowMs: 10 * MINUTE_MS, lockMs: 10 * MINUTE_MS, maxLockMs: 6 * HOUR_MS },
  /** The same while codes are being guessed from many sources at once. */
  codeUnderAttack: { tries: 5, windowMs: 10 * MINUTE_MS, lockMs: 10 * MINUTE_MS, maxLockMs: 6 * HOUR_MS },
  /** Codes that lead nowhere from everybody together: past this number each source is allowed fewer. Locks nobody. */
  codeOverall: { tries: 600, windowMs: 10 * MINUTE_MS, lockMs: 10 * MINUTE_MS, maxLockMs: 10 * MINUTE_MS },
} as const satisfies Readonly<Record<string, TryPolicy>>
