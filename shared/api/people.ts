import { z } from 'zod'
import { endpoint } from './endpoint'
import { idSchema, pageOf, pageQuerySchema } from './fields'

/** Who is asking. `null` when nobody is signed in. A guest belongs to one lesson and has no address. */
export const meSchema = z.strictObject({
  id: idSchema,
  name: z.string(),
  email: z.string().nullable(),
  isVerified: z.boolean(),
  isGuest: z.boolean(),
  isAdministrator: z.boolean(),
  mayMakeCourses: z.boolean(),
})
export type Me = z.infer<typeof meSchema>

export const personSchema = meSchema.extend({ createdAt: z.string(), courses: z.int() })

export const people = {
  me: endpoint({
    method: 'GET',
    path: '/api/me',
    reply: z.strictObject({ me: meSchema.nullable(), isDemo: z.boolean() }),
  }),
  /** Administrator: everyone with an account. */
  list: endpoint({ method: 'GET', path: '/api/people', query: pageQuerySchema, reply: pageOf(personSchema) }),
  /** Administrator: lets a person make courses, or no longer. */
  update: endpoint({
    method: 'PATCH',
    path: '/api/people/:userId',
    body: z.strictObject({ mayMakeCourses: z.boolean() }),
    reply: personSchema,
  }),
}
