/** The general tool doing the same piece of work, started as its own package does, and asked the same questions. */
import { createServer } from 'node:http'
import { setupWSConnection } from '@y/websocket-server/utils'
import { WebSocketServer } from 'ws'

const sockets = new WebSocketServer({ noServer: true })
const httpServer = createServer()
sockets.on('connection', setupWSConnection)
httpServer.on('upgrade', (request, socket, head) => {
  sockets.handleUpgrade(request, socket, head, (opened) => sockets.emit('connection', opened, request))
})
httpServer.listen(0, '127.0.0.1', () => process.send({ kind: 'ready', value: httpServer.address().port }))

process.on('message', ({ question }) => {
  if (question !== 'cpu') return
  const { user, system } = process.cpuUsage()
  process.send({ kind: 'cpu', value: (user + system) / 1000 })
})
process.on('disconnect', () => process.exit(0))
