import { randomBytes } from 'node:crypto'

const ID_BYTES = 16

/** An id of 128 random bits that nobody guesses, safe in addresses: 22 of `A–Z a–z 0–9 _ -`. */
export const createId = (): string => randomBytes(ID_BYTES).toString('base64url')
