import type { AddressInfo } from 'node:net'
import compression from 'compression'
import express from 'express'

export type ServedFolder = Readonly<{ origin: string; close: () => Promise<void> }>

/** Serves an exported app on loopback, compressed for browsers that take it, the page itself at every unknown path. */
export function serveFolder(folder: string): Promise<ServedFolder> {
  const app = express()
  app.use(compression())
  app.use(express.static(folder))
  app.get('/{*path}', (_request, response) => response.sendFile('index.html', { root: folder }))
  return new Promise((resolve, reject) => {
    const server = app.listen(0, '127.0.0.1', (error) => {
      if (error) return reject(error)
      const { port } = server.address() as AddressInfo
      resolve({
        origin: `http://127.0.0.1:${port}`,
        close: () =>
          new Promise((done) => {
            server.close(() => done())
            server.closeAllConnections()
          }),
      })
    })
  })
}
