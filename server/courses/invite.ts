import { listMemberEmails } from '@/db/queries/course-members'
import { deleteInvitation, upsertEmailInvitation } from '@/db/queries/invitations'
import type { CourseView } from '@/db/queries/courses'
import type { Person } from '@/server/auth/asker'
import { createToken, hashToken } from '@/server/auth/token'
import { Refused } from '@/server/errors/refused'
import { invitationMessage } from '@/server/mail/messages'
import type { Context } from '@/server/routes/context'
import { MAX_INVITATIONS_AT_ONCE } from '@/shared/api/courses'
import type { CourseRole } from '@/shared/api/fields'
import { parseAddresses } from '@/shared/api/parse-addresses'

export const INVITATION_MS = 14 * 24 * 60 * 60 * 1000

export const invitationUrl = (publicUrl: string, token: string): string => `${publicUrl}/invitations/${token}`

/** Sends an invitation to every address in a pasted text, and says what became of each. */
export async function inviteMany(
  { db, config, mailer, limits }: Context,
  person: Person,
  course: CourseView,
  { pasted, role }: Readonly<{ pasted: string; role: CourseRole }>,
) {
  const { addresses, refused } = parseAddresses(pasted)
  if (addresses.length > MAX_INVITATIONS_AT_ONCE) {
    throw new Refused('invalid', {
      fields: [{ path: 'pasted', code: 'too-many', args: { max: MAX_INVITATIONS_AT_ONCE } }],
    })
  }
  const already = await listMemberEmails(db, course.id, addresses)
  const invited = addresses.filter((address) => !already.includes(address))
  for (const _ of invited) {
    const waitMs = await limits.takeInvitation(course.id)
    if (waitMs > 0) throw new Refused('too-many-tries', { retryAfterSeconds: Math.ceil(waitMs / 1000) })
  }
  const letters = []
  for (const email of invited) {
    const token = createToken()
    const { id } = await upsertEmailInvitation(db, {
      courseId: course.id,
      role,
      tokenHash: hashToken(token),
      invitedBy: person.id,
      expiresAt: new Date(Date.now() + INVITATION_MS),
      email,
    })
    const url = invitationUrl(config.publicUrl, token)
    letters.push({
      id,
      message: invitationMessage(email, { courseName: course.name, role, invitedBy: person.name, url }),
    })
  }
  const failed = new Set(await mailer.sendMany(letters.map(({ message }) => message)))
  for (const { id, message } of letters) {
    // An invitation nobody was told of would only be in the way of the next try.
    if (failed.has(message.to)) await deleteInvitation(db, course.id, id)
  }
  return {
    sent: invited.filter((address) => !failed.has(address)),
    already: [...already],
    refused: [
      ...refused.map((text) => ({ text, why: 'not-an-address' as const })),
      ...[...failed].map((text) => ({ text, why: 'mail-failed' as const })),
    ],
  }
}
