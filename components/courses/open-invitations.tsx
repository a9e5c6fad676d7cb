import { View } from 'react-native'
import { RefusalNotice, useMutation, type Query, type ReplyOf } from '@/components/api'
import { space } from '@/components/theme'
import { Button, Heading, Row, Rows, Txt } from '@/components/ui'
import { formatDate, useWords } from '@/components/words'
import { api } from '@/shared/api'

/** Invitations nobody has taken yet; each can be withdrawn. */
export function OpenInvitations({
  courseId,
  query,
}: Readonly<{ courseId: string; query: Query<ReplyOf<typeof api.courses.invitations>> }>) {
  const words = useWords().courses
  const withdraw = useMutation(api.courses.withdrawInvitation)
  const list = query.data?.invitations
  if (!list || list.length === 0) return null
  const remove = async (invitationId: string) => {
    const result = await withdraw.run({ params: { courseId, invitationId } })
    if (result.ok) query.reload()
  }
  return (
    <View style={{ gap: space.small }}>
      <Heading level={3}>{words.invite.pending}</Heading>
      <RefusalNotice refusal={withdraw.refusal} />
      <Rows label={words.invite.pending}>
        {list.map(({ id, email, role, expiresAt }) => (
          <Row
            key={id}
            side={
              <Button
                label={words.invite.withdraw}
                hint={words.invite.withdrawOf(email ?? words.invite.pendingLink)}
                onPress={() => void remove(id)}
              />
            }
          >
            <Txt>{email ?? words.invite.pendingLink}</Txt>
            <Txt kind="note" tone="lead" isTabular>
              {words.invite.until(words.roles[role], formatDate(expiresAt))}
            </Txt>
          </Row>
        ))}
      </Rows>
    </View>
  )
}
