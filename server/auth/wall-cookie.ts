import type { CookieOptions } from 'express'

/** Name of the cookie that lets a screen show one lesson. */
export const WALL_COOKIE = 'bicinium.wall'
export const WALL_COOKIE_MS = 12 * 60 * 60 * 1000

export const wallCookieOptions = (publicUrl: string): CookieOptions => ({
  httpOnly: true,
  sameSite: 'lax',
  secure: publicUrl.startsWith('https:'),
  maxAge: WALL_COOKIE_MS,
  path: '/',
})

const VALUE = /^[A-Za-z0-9_-]{20,100}$/

/** The wall's token in a cookie header, if there is one. */
export function readWallCookie(header: string): string | null {
  for (const part of header.split(';')) {
    const [name, value = ''] = part.trim().split('=')
    if (name === WALL_COOKIE) return VALUE.test(value) ? value : null
  }
  return null
}
