import type { RequestHandler } from 'express'
import helmet from 'helmet'

/** Ours and nobody else's: no script but the served ones, no third-party origin, no framing. */
export function securityHeaders({
  publicUrl,
  allowedOrigins,
}: Readonly<{ publicUrl: string; allowedOrigins: readonly string[] }>): RequestHandler {
  const isSecure = publicUrl.startsWith('https:')
  // `'self'` covers WebSockets in today's browsers; older ones want them named.
  const sockets = allowedOrigins.map((origin) => origin.replace(/^http/, 'ws'))
  return helmet({
    contentSecurityPolicy: {
      useDefaults: false,
      directives: {
        defaultSrc: ["'self'"],
        scriptSrc: ["'self'"],
        // The bundler starts a worker from a blob that loads the served script.
        workerSrc: ["'self'", 'blob:'],
        // The renderer of React Native's styles writes style elements; styles run nothing.
        styleSrc: ["'self'", "'unsafe-inline'"],
        imgSrc: ["'self'", 'data:'],
        fontSrc: ["'self'"],
        mediaSrc: ["'self'", 'blob:'],
        connectSrc: ["'self'", ...sockets],
        objectSrc: ["'none'"],
        baseUri: ["'none'"],
        formAction: ["'self'"],
        frameAncestors: ["'none'"],
        ...(isSecure && { upgradeInsecureRequests: [] }),
      },
    },
    strictTransportSecurity: isSecure && { maxAge: 180 * 24 * 60 * 60 },
    // Browsers ignore these two without https, and complain.
    crossOriginOpenerPolicy: isSecure,
    originAgentCluster: isSecure,
    // Codes and tokens stand in addresses: no other site is told them.
    referrerPolicy: { policy: 'no-referrer' },
    xFrameOptions: { action: 'deny' },
  })
}
