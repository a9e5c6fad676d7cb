import { createHmac, randomBytes, timingSafeEqual } from 'node:crypto'
import { z } from 'zod'
import { fail, ok, type Result } from '@/shared/result'

/** Long enough to type it or carry it over to the projector's machine. */
export const WALL_LINK_MS = 15 * 60 * 1000

const claimSchema = z.tuple([z.string().max(64), z.string().max(64), z.string().max(64), z.int()])

/** Which lesson's wall a link opens, who made it, and until when. */
export type WallClaim = Readonly<{ lessonId: string; linkId: string; madeBy: string; expiresAt: Date }>

const signatureOf = (payload: string, secret: string) =>
  createHmac('sha256', secret).update(`wall-link.${payload}`).digest().subarray(0, 24)

export const createLinkId = (): string => randomBytes(12).toString('base64url')

/** Writes a claim as a token that nobody else can write: `payload.signature`. */
export function signWallLink({ lessonId, linkId, madeBy, expiresAt }: WallClaim, secret: string): string {
  const claim = [lessonId, linkId, madeBy, Math.floor(expiresAt.getTime() / 1000)]
  const payload = Buffer.from(JSON.stringify(claim)).toString('base64url')
  return `${payload}.${signatureOf(payload, secret).toString('base64url')}`
}

/** Reads a token back. `ended`: ours, but its time is over. */
export function readWallLink(
  token: string,
  secret: string,
  now: Date,
): Result<WallClaim, 'forged' | 'ended'> {
  const [payload = '', signature = '', ...rest] = token.split('.')
  const given = Buffer.from(signature, 'base64url')
  const right = signatureOf(payload, secret)
  if (rest.length > 0 || given.length !== right.length || !timingSafeEqual(given, right))
    return fail('forged')
  const [lessonId, linkId, madeBy, seconds] = claimSchema.parse(
    JSON.parse(Buffer.from(payload, 'base64url').toString()),
  )
  const expiresAt = new Date(seconds * 1000)
  return expiresAt > now ? ok({ lessonId, linkId, madeBy, expiresAt }) : fail('ended')
}
