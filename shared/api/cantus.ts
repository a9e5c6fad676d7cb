import { z } from 'zod'
import { CLEFS } from '@/shared/theory/clef'
import { MODES } from '@/shared/theory/mode'
import { MAX_BARS, MIN_BARS, pitchClassNameSchema, pitchNameSchema } from '@/shared/wire/documents'
import { endpoint } from './endpoint'
import { idSchema, titleSchema } from './fields'

export const MAX_SOURCE_CHARACTERS = 200

const written = {
  title: titleSchema,
  notes: z.array(pitchNameSchema).min(MIN_BARS, 'too-short').max(MAX_BARS, 'too-long'),
  mode: z.enum(MODES),
  final: pitchClassNameSchema,
  clef: z.enum(CLEFS),
}

export const cantusBodySchema = z.strictObject({
  ...written,
  source: z.string().trim().max(MAX_SOURCE_CHARACTERS, 'too-long').default(''),
  /** Course it is shared with, or null to keep it to oneself. */
  courseId: idSchema.nullable().default(null),
})
export type CantusBody = z.output<typeof cantusBodySchema>

export const cantusSchema = z.strictObject({
  id: idSchema,
  ...written,
  source: z.string(),
  /** `published`: out of a named book. `invented`: made for this library. `own`: written by a teacher of the school. */
  origin: z.enum(['published', 'invented', 'own']),
  courseId: idSchema.nullable(),
  isMine: z.boolean(),
})
export type Cantus = z.infer<typeof cantusSchema>

const reply = z.strictObject({ cantus: cantusSchema })

export const cantus = {
  list: endpoint({
    method: 'GET',
    path: '/api/cantus',
    reply: z.strictObject({ cantus: z.array(cantusSchema) }),
  }),
  get: endpoint({ method: 'GET', path: '/api/cantus/:cantusId', reply }),
  create: endpoint({ method: 'POST', path: '/api/cantus', body: cantusBodySchema, reply }),
  update: endpoint({ method: 'PATCH', path: '/api/cantus/:cantusId', body: cantusBodySchema, reply }),
  remove: endpoint({ method: 'DELETE', path: '/api/cantus/:cantusId', reply: z.strictObject({}) }),
}
