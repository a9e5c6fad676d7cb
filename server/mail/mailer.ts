import { Resend } from 'resend'
import type { Logger } from 'pino'

export type Message = Readonly<{ to: string; subject: string; text: string }>

export type Mailer = Readonly<{
  /** Hands one message over to the provider. Throws `MailFailed` when it is not taken. */
  send: (message: Message) => Promise<void>
  /** Hands many over, in as few requests as the provider allows; gives the addresses whose message was not taken. */
  sendMany: (messages: readonly Message[]) => Promise<readonly string[]>
}>

export class MailFailed extends Error {
  override readonly name = 'MailFailed'
}

/** What the provider takes in one request. */
const MOST_AT_ONCE = 100

/** Guests and people of test schools have addresses that lead nowhere. */
const isNowhere = (address: string) => address.endsWith('.invalid')

/** Mail through the hosted provider's SDK, or, by `baseUrl`, through a local server that speaks its HTTP. */
export function createMailer(
  { apiKey, from, baseUrl }: Readonly<{ apiKey: string; from: string; baseUrl?: string | undefined }>,
  log: Logger,
): Mailer {
  const provider = new Resend(apiKey, { ...(baseUrl !== undefined && { baseUrl }) })
  const written = (message: Message) => ({ from, ...message })
  const note = (error: { name: string; message: string }) =>
    log.error({ why: error.name }, 'the mail provider refused a message')
  return {
    async send(message) {
      if (isNowhere(message.to)) return
      const { error } = await provider.emails.send(written(message))
      if (!error) return
      note(error)
      throw new MailFailed(error.name)
    },
    async sendMany(messages) {
      const failed: string[] = []
      for (let start = 0; start < messages.length; start += MOST_AT_ONCE) {
        const some = messages.slice(start, start + MOST_AT_ONCE)
        const { error } = await provider.batch.send(some.map(written))
        if (!error) continue
        note(error)
        failed.push(...some.map(({ to }) => to))
      }
      return failed
    },
  }
}
