import { randomBytes } from 'node:crypto'
import { mkdirSync, readFileSync, writeFileSync } from 'node:fs'
import path from 'node:path'

/** The secret of cookies and links, made once and kept where only its owner can read it. */
export function readSecret(dataDirectory: string): string {
  const file = path.join(dataDirectory, 'auth-secret')
  mkdirSync(dataDirectory, { recursive: true })
  try {
    // Fails where it exists: two starts at once end with one secret.
    writeFileSync(file, randomBytes(32).toString('base64url'), { mode: 0o600, flag: 'wx' })
  } catch (error) {
    if ((error as NodeJS.ErrnoException).code !== 'EEXIST') throw error
  }
  return readFileSync(file, 'utf8').trim()
}
