import { useRouter } from 'expo-router'
import { View } from 'react-native'
import { Asked, RefusalNotice, useMutation, useQuery } from '@/components/api'
import { auth, Frame, loadSession, useSession } from '@/components/session'
import { space } from '@/components/theme'
import { Button, LinkButton, Name, Refused, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'

/** Where an invitation leads: what it is, and coming in. */
export function InvitationPage({ token }: Readonly<{ token: string }>) {
  const words = useWords().courses
  const router = useRouter()
  const { me: someone } = useSession()
  const me = someone && !someone.isGuest ? someone : null
  const query = useQuery(api.courses.peekInvitation, { params: { token } })
  const accept = useMutation(api.courses.acceptInvitation)
  const to = encodeURIComponent(`/invitations/${token}`)

  const comeIn = async () => {
    const result = await accept.run({ params: { token } })
    if (result.ok) router.replace(`/courses/${result.value.courseId}` as never)
  }
  const isGone = query.refusal?.code === 'not-found' || query.refusal?.code === 'ended'

  return (
    <Frame
      me={me}
      title={words.invitation.title}
      heading={query.data ? words.invitation.heading(query.data.courseName) : undefined}
      width="text"
    >
      {isGone ? (
        <Refused title={words.invitation.gone} href="/">
          {words.invitation.goneMore}
        </Refused>
      ) : (
        <Asked query={query} lines={2}>
          {({ role, invitedBy, email }) => (
            <View style={{ gap: space.one }}>
              <Txt>
                <Name>{invitedBy}</Name> {words.invitation.fromLine(words.roles[role])}
              </Txt>
              {email && me?.email !== email ? <Txt tone="lead">{words.invitation.for(email)}</Txt> : null}
              <RefusalNotice refusal={accept.refusal} />
              {me ? (
                <>
                  <Txt tone="lead">
                    {words.invitation.signedInAs} <Name>{me.name}</Name>.
                  </Txt>
                  <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small }}>
                    <Button
                      kind="go"
                      label={words.invitation.accept}
                      isBusy={accept.isBusy}
                      onPress={() => void comeIn()}
                    />
                    <Button
                      label={words.invitation.otherAccount}
                      onPress={() => void auth.signOut().then(loadSession)}
                    />
                  </View>
                </>
              ) : (
                <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small }}>
                  <LinkButton kind="go" href={`/sign-in?to=${to}`} label={words.invitation.signInFirst} />
                  <LinkButton href={`/sign-up?to=${to}`} label={words.invitation.makeAccount} />
                </View>
              )}
            </View>
          )}
        </Asked>
      )}
    </Frame>
  )
}
