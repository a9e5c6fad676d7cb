import { createHash, randomBytes } from 'node:crypto'

const TOKEN_BYTES = 32

/** A secret for a link or a cookie: 256 random bits. */
export const createToken = (): string => randomBytes(TOKEN_BYTES).toString('base64url')

/** What is kept of a token, so that a copy of the database opens nothing. */
export const hashToken = (token: string): string => createHash('sha256').update(token).digest('base64url')
