import { connect, createServer, type AddressInfo, type Socket } from 'node:net'

/** A wire between a phone and the server that can be cut: every connection ends at once, and none is made until it is mended. */
export type CutLine = Readonly<{
  origin: string
  cut: () => void
  mend: () => void
  close: () => Promise<void>
}>

/**
 * Lays a wire to the server's port. The browser's own "offline" leaves open sockets open; a school's Wi-Fi does not.
 * `port` 0: one of the system's choosing.
 */
export function layLine(targetPort: number, port = 0): Promise<CutLine> {
  const ends = new Set<Socket>()
  let isCut = false
  const server = createServer((phone) => {
    if (isCut) return phone.destroy()
    const house = connect(targetPort, '127.0.0.1')
    for (const end of [phone, house]) {
      ends.add(end)
      end.on('error', () => end.destroy())
      end.on('close', () => {
        ends.delete(end)
        phone.destroy()
        house.destroy()
      })
    }
    phone.pipe(house)
    house.pipe(phone)
  })
  const dropAll = (): void => {
    for (const end of ends) end.destroy()
  }
  return new Promise((resolve, reject) => {
    server.on('error', reject)
    server.listen(port, '127.0.0.1', () =>
      resolve({
        origin: `http://localhost:${(server.address() as AddressInfo).port}`,
        cut() {
          isCut = true
          dropAll()
        },
        mend() {
          isCut = false
        },
        close: () =>
          new Promise((done) => {
            server.close(() => done())
            dropAll()
          }),
      }),
    )
  })
}
