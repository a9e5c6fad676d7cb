import type { ColumnType, Generated } from 'kysely'

type Time = ColumnType<Date, Date | string | undefined, Date | string>

/**
 * The four tables of the sign-in library, named and spelled as it wants them, with our own columns on `user`. That is why
 * the whole database spells its columns in camel case: a row is a value without a renaming layer in between.
 */
export interface UserTable {
  id: string
  name: string
  /** Lower case. A guest has a placeholder under `.invalid`, never told to anyone. */
  email: string
  emailVerified: boolean
  image: string | null
  createdAt: Time
  updatedAt: Time
  /** A guest: lives for one lesson, has no address and no password. */
  isAnonymous: boolean | null
  isAdministrator: Generated<boolean>
  mayMakeCourses: Generated<boolean>
}

export interface SessionTable {
  id: string
  userId: string
  token: string
  expiresAt: Time
  ipAddress: string | null
  userAgent: string | null
  createdAt: Time
  updatedAt: Time
}

export interface AccountTable {
  id: string
  userId: string
  accountId: string
  providerId: string
  accessToken: string | null
  refreshToken: string | null
  idToken: string | null
  accessTokenExpiresAt: Date | null
  refreshTokenExpiresAt: Date | null
  scope: string | null
  /** Hash, by the sign-in library's own function. */
  password: string | null
  createdAt: Time
  updatedAt: Time
}

export interface VerificationTable {
  id: string
  identifier: string
  value: string
  expiresAt: Time
  createdAt: Time
  updatedAt: Time
}
