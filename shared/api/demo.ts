import { z } from 'zod'
import { endpoint } from './endpoint'

/** The demo's view of mail that the local fake took in. Not found outside the demo. */
export const demo = {
  mail: endpoint({
    method: 'GET',
    path: '/api/demo/mail',
    reply: z.strictObject({
      messages: z.array(
        z.strictObject({
          id: z.string(),
          to: z.string(),
          subject: z.string(),
          text: z.string(),
          sentAt: z.string(),
        }),
      ),
    }),
  }),
  /** Who may be signed in as, with the demo's password. */
  people: endpoint({
    method: 'GET',
    path: '/api/demo/people',
    reply: z.strictObject({
      password: z.string(),
      people: z.array(z.strictObject({ name: z.string(), email: z.string(), role: z.string() })),
    }),
  }),
}
