import type { CourseRole } from '@/shared/api/fields'
import type { Message } from './mailer'

/** The words of our mail. Plain text: a message that asks to follow a link should show where it leads. */
const signature = '\n\nBicinium'

export const verificationMessage = (to: string, name: string, url: string): Message => ({
  to,
  subject: 'Confirm your address',
  text: `Dear ${name},\n\nopen this link to confirm your address and come in:\n\n${url}\n\nIt works for one day. If you did not make an account, leave this message alone and nothing will happen.${signature}`,
})

export const resetMessage = (to: string, name: string, url: string): Message => ({
  to,
  subject: 'Set a new password',
  text: `Dear ${name},\n\nopen this link to choose a new password:\n\n${url}\n\nIt works for one hour, once. If you did not ask for it, leave this message alone; your password stays as it is.${signature}`,
})

export const welcomeAdministratorMessage = (to: string, url: string): Message => ({
  to,
  subject: 'You look after Bicinium',
  text: `This address was named as the first administrator's. Open this link to choose a password:\n\n${url}\n\nIt works for one hour; after that, ask for a new password on the sign-in page.${signature}`,
})

/** To somebody who has an account and signs up again: the page itself must not tell who has one. */
export const existingAccountMessage = (to: string, name: string, url: string): Message => ({
  to,
  subject: 'You have an account already',
  text: `Dear ${name},\n\nsomebody, probably you, tried to make an account with this address. You have one already. If you forgot the password, choose a new one here:\n\n${url}${signature}`,
})

const asWhat: Readonly<Record<CourseRole, string>> = {
  teacher: 'as a teacher',
  assistant: 'as an assistant',
  student: 'as a student',
}

export const invitationMessage = (
  to: string,
  {
    courseName,
    role,
    invitedBy,
    url,
  }: Readonly<{ courseName: string; role: CourseRole; invitedBy: string; url: string }>,
): Message => ({
  to,
  subject: `Invitation to ${courseName}`,
  text: `${invitedBy} asks you to join “${courseName}” ${asWhat[role]}. Open this link to do so:\n\n${url}\n\nIt works for fourteen days and for this address.${signature}`,
})
