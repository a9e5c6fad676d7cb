import { existsSync, readFileSync, statSync } from 'node:fs'
import { createServer } from 'node:http'
import type { AddressInfo } from 'node:net'
import path from 'node:path'
import { brotliCompressSync } from 'node:zlib'

export type ServedFolder = Readonly<{ origin: string; close: () => Promise<void> }>

const TYPES: Readonly<Record<string, string>> = {
  '.html': 'text/html; charset=utf-8',
  '.js': 'text/javascript; charset=utf-8',
  '.css': 'text/css; charset=utf-8',
  '.json': 'application/json',
}

/**
 * Serves an exported app on loopback, its texts compressed as well as brotli can, as our own server does; the page itself
 * stands at every address that is no file.
 */
export function serveFolder(folder: string): Promise<ServedFolder> {
  const compressed = new Map<string, Buffer>()
  const server = createServer((request, response) => {
    const asked = path.join(folder, path.normalize(new URL(request.url ?? '/', 'http://local').pathname))
    const file = existsSync(asked) && statSync(asked).isFile() ? asked : path.join(folder, 'index.html')
    const type = TYPES[path.extname(file)]
    if (!type) return response.end(readFileSync(file))
    const body = compressed.get(file) ?? brotliCompressSync(readFileSync(file))
    compressed.set(file, body)
    response.writeHead(200, { 'content-type': type, 'content-encoding': 'br' }).end(body)
  })
  return new Promise((resolve, reject) => {
    server.once('error', reject)
    server.listen(0, '127.0.0.1', () =>
      resolve({
        origin: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
        close: () =>
          new Promise((done) => {
            server.close(() => done())
            server.closeAllConnections()
          }),
      }),
    )
  })
}
