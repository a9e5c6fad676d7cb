/**
 * Where to go after signing in: a path of this site, or `/home`. An address of another site, however written, is not
 * followed: `//elsewhere.example` and `/\elsewhere.example` are such addresses to a browser.
 */
export function parseReturnPath(to: unknown): string {
  if (typeof to !== 'string' || !to.startsWith('/')) return '/home'
  try {
    const base = 'https://here.example'
    const url = new URL(to, base)
    return url.origin === base ? url.pathname + url.search : '/home'
  } catch {
    return '/home'
  }
}

const KEY = 'bicinium.return'

/**
 * Keeps where somebody was going while their address is confirmed: the message's link opens a page that knows nothing of
 * it. In the same browser, until it is taken.
 */
export function keepReturnPath(to: string): void {
  try {
    localStorage.setItem(KEY, to)
  } catch {
    // Then the way leads home.
  }
}

export function takeReturnPath(): string {
  try {
    const to = localStorage.getItem(KEY)
    localStorage.removeItem(KEY)
    return parseReturnPath(to)
  } catch {
    return parseReturnPath(null)
  }
}
