import type { ColumnType } from 'kysely'

/** Failed tries at something secret, counted by whom or at what. Kept here so that a restart forgives nobody. */
export interface AttemptTable {
  /** Such as `sign-in:` and a hash of the address; never the secret that was tried. */
  key: string
  failures: number
  windowStartedAt: ColumnType<Date, Date, Date>
  lockedUntil: ColumnType<Date | null, Date | null, Date | null>
  /** How often it was locked in a row; each time is longer. */
  locks: number
}
