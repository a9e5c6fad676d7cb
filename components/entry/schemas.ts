import { z } from 'zod'
import { emailSchema, nameSchema } from '@/shared/api/fields'

export const MIN_PASSWORD_CHARACTERS = 10
export const MAX_PASSWORD_CHARACTERS = 128

const newPassword = z
  .string()
  .min(1, 'empty')
  .min(MIN_PASSWORD_CHARACTERS, 'password-short')
  .max(MAX_PASSWORD_CHARACTERS, 'password-long')
const oldPassword = z.string().min(1, 'empty')
const email = z.string().trim().min(1, 'empty').pipe(emailSchema)

/** Forms of the sign-in family, judged before they are sent; the messages are the codes of the words. */
export const signInSchema = z.object({ email, password: oldPassword })
export const signUpSchema = z.object({ name: nameSchema, email, password: newPassword })
export const forgotSchema = z.object({ email })
export const resetSchema = z.object({ password: newPassword })
export const changePasswordSchema = z.object({ currentPassword: oldPassword, password: newPassword })
export const renameSchema = z.object({ name: nameSchema })
