import type { Request } from 'express'

/** Internal header by which the sign-in library's hooks learn the source; whatever a client sends under it is dropped. */
export const SOURCE_HEADER = 'x-bicinium-source'

/**
 * Where a request comes from, for counting tries: its address, believing as many proxies as configured. Of an IPv6 address
 * the /64, for that is what one household is given.
 */
export function sourceOf(request: Pick<Request, 'ip'>): string {
  const ip = request.ip ?? 'unknown'
  if (!ip.includes(':')) return ip
  const mapped = /^::ffff:(\d+\.\d+\.\d+\.\d+)$/i.exec(ip)
  if (mapped?.[1]) return mapped[1]
  const [head = ''] = ip.split('::')
  const groups = head.split(':').filter(Boolean)
  return ip.includes('::') && groups.length < 4
    ? `${groups.join(':')}::/64`
    : `${groups.slice(0, 4).join(':')}::/64`
}

/**
 * The origin to write into a link for other machines: the one under which the asking page was reached, where it is one of
 * ours. A teacher who came by the address of the local network sends phones and projectors there.
 */
export const originFor = (
  request: Request,
  { publicUrl, allowedOrigins }: Readonly<{ publicUrl: string; allowedOrigins: readonly string[] }>,
): string => allowedOrigins.find((origin) => origin === request.headers.origin) ?? publicUrl
