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
