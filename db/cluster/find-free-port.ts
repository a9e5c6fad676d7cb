import { createServer } from 'node:net'

/** A TCP port that nobody listens on at this moment: `preferred` where it is free, else one of the system's choosing. */
export function findFreePort(preferred = 0, host = '127.0.0.1'): Promise<number> {
  return new Promise((resolve, reject) => {
    const probe = createServer()
    probe.once('error', (error: NodeJS.ErrnoException) => {
      if (preferred !== 0 && (error.code === 'EADDRINUSE' || error.code === 'EACCES')) {
        findFreePort(0, host).then(resolve, reject)
      } else reject(error)
    })
    probe.listen(preferred, host, () => {
      const address = probe.address()
      const port = typeof address === 'object' && address ? address.port : 0
      probe.close(() => resolve(port))
    })
  })
}
