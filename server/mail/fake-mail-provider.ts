import { randomUUID } from 'node:crypto'
import type { AddressInfo } from 'node:net'
import express from 'express'
import { z } from 'zod'

/** The newest are kept, in memory. */
const MOST_KEPT = 500

const messageSchema = z.object({
  from: z.string(),
  to: z.union([z.string(), z.array(z.string())]),
  subject: z.string(),
  text: z.string(),
})

export type KeptMessage = Readonly<{ id: string; to: string; subject: string; text: string; sentAt: string }>

export type FakeMailProvider = Readonly<{
  url: string
  /** Newest first. */
  messages: () => readonly KeptMessage[]
  /** From now on refuses what it is given, as a provider does whose limit is reached. */
  setRefusing: (isRefusing: boolean) => void
  close: () => Promise<void>
}>

/** A server on loopback that speaks the mail provider's HTTP and delivers nothing: it keeps what it was given. */
export async function startFakeMailProvider(): Promise<FakeMailProvider> {
  let kept: KeptMessage[] = []
  let isRefusing = false
  const keep = (message: z.infer<typeof messageSchema>) => {
    const id = randomUUID()
    const to = [message.to].flat().join(', ')
    kept = [
      { id, to, subject: message.subject, text: message.text, sentAt: new Date().toISOString() },
      ...kept,
    ]
    kept.length = Math.min(kept.length, MOST_KEPT)
    return { id }
  }
  const app = express()
  app.use(express.json({ limit: '5mb' }))
  app.use((request, response, next) => {
    if (!/^Bearer .+/.test(request.headers.authorization ?? '')) {
      response.status(401).json({ statusCode: 401, name: 'missing_api_key', message: 'Missing API key' })
    } else if (isRefusing) {
      response
        .status(429)
        .json({ statusCode: 429, name: 'rate_limit_exceeded', message: 'Too many requests' })
    } else next()
  })
  const refuse = (response: express.Response) =>
    response.status(422).json({ statusCode: 422, name: 'validation_error', message: 'Not a message' })
  app.post('/emails', (request, response) => {
    const parsed = messageSchema.safeParse(request.body)
    if (parsed.success) response.json(keep(parsed.data))
    else refuse(response)
  })
  app.post('/emails/batch', (request, response) => {
    const parsed = z.array(messageSchema).min(1).max(100).safeParse(request.body)
    if (parsed.success) response.json({ data: parsed.data.map(keep) })
    else refuse(response)
  })
  const server = app.listen(0, '127.0.0.1')
  await new Promise((resolve, reject) => server.once('listening', resolve).once('error', reject))
  return {
    url: `http://127.0.0.1:${(server.address() as AddressInfo).port}`,
    messages: () => kept,
    setRefusing: (refusing) => (isRefusing = refusing),
    close: () => {
      server.closeAllConnections()
      return new Promise((resolve) => server.close(() => resolve()))
    },
  }
}
