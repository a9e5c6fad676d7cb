/** Fields that several requests share, with their limits. */
import { z } from 'zod'

/** Control and bidirectional-override characters, which could hide or reorder what a name says, and halves of characters. */
// eslint-disable-next-line no-control-regex -- these are the characters to refuse
const HIDDEN = /[\u0000-\u001f\u007f-\u009f\u061c\u200e\u200f\u202a-\u202e\u2066-\u2069\ufeff\ud800-\udfff]/u

export const MAX_NAME_CHARACTERS = 60
export const MAX_TITLE_CHARACTERS = 120
export const MAX_RULE_SET_NAME_CHARACTERS = 80
export const MAX_EMAIL_CHARACTERS = 254
export const PAGE_SIZE = 50

const words = (max: number) =>
  z
    .string()
    .trim()
    .min(1, 'empty')
    .max(max, 'too-long')
    .refine((text) => !HIDDEN.test(text), 'hidden-characters')

export const nameSchema = words(MAX_NAME_CHARACTERS)
export const titleSchema = words(MAX_TITLE_CHARACTERS)
export const ruleSetNameSchema = words(MAX_RULE_SET_NAME_CHARACTERS)
export const emailSchema = z
  .string()
  .trim()
  .toLowerCase()
  .max(MAX_EMAIL_CHARACTERS, 'too-long')
  .pipe(z.email('not-an-address'))
export const idSchema = z.string().regex(/^[A-Za-z0-9_-]{8,64}$/, 'not-an-id')
export const timeSchema = z.iso.datetime()
export const courseRoleSchema = z.enum(['teacher', 'assistant', 'student'])
export type CourseRole = z.infer<typeof courseRoleSchema>

/** A page of a list: what it holds and where the next begins, if there is more. */
export const pageOf = <Item extends z.ZodType>(item: Item) =>
  z.strictObject({ items: z.array(item), total: z.int().min(0), nextOffset: z.int().nullable() })

export const pageQuerySchema = z.strictObject({
  offset: z.coerce.number().int().min(0).max(100_000).default(0),
  search: z.string().max(100).default(''),
})
