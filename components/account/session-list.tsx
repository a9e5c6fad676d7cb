import { useRouter } from 'expo-router'
import { useState } from 'react'
import { View } from 'react-native'
import { RefusalNotice, useAct } from '@/components/api'
import { auth, loadSession, type ListedSession } from '@/components/session'
import { space } from '@/components/theme'
import { Button, Dialog, Loading, Row, Rows, Txt } from '@/components/ui'
import { formatDateTime, useWords } from '@/components/words'
import { parseDevice } from './device-name'
import { Section } from './section'
import type { Sessions } from './use-sessions'

/** Every session of this person; each can be ended, and all together. */
export function SessionList({ list, currentId, refusal, reload }: Sessions) {
  const words = useWords()
  const router = useRouter()
  const end = useAct(auth.endSession)
  const leave = useAct((isEverywhere: boolean) => (isEverywhere ? auth.endEverySession() : auth.signOut()))
  const [isAsking, setAsking] = useState(false)

  const nameOf = ({ userAgent }: ListedSession) => {
    const { browser, system } = parseDevice(userAgent)
    return browser && system
      ? words.account.device(browser, system)
      : (browser ?? system ?? words.account.unknownDevice)
  }
  const signOut = async (isEverywhere: boolean) => {
    const result = await leave.run(isEverywhere)
    if (!result.ok) return
    setAsking(false)
    // First away from the page that asks for a person, or it would send one to sign in.
    router.replace('/')
    await loadSession()
  }

  return (
    <Section title={words.account.sessions}>
      <RefusalNotice refusal={refusal ?? end.refusal ?? leave.refusal} />
      {list ? (
        <Rows label={words.account.sessions}>
          {list.map((session) => (
            <Row
              key={session.id}
              side={
                session.id === currentId ? null : (
                  <Button
                    label={words.account.end}
                    hint={words.account.endOne(nameOf(session))}
                    onPress={() => void end.run(session.token).then(reload)}
                  />
                )
              }
            >
              <Txt isStrong={session.id === currentId}>
                {session.id === currentId ? `${nameOf(session)}, ${words.account.thisOne}` : nameOf(session)}
              </Txt>
              <Txt kind="note" tone="lead" isTabular>
                {`${words.account.since(formatDateTime(session.createdAt))}, ${words.account.lastSeen(formatDateTime(session.updatedAt))}`}
              </Txt>
            </Row>
          ))}
        </Rows>
      ) : refusal ? null : (
        <Loading lines={2} heightPx={68} />
      )}
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small }}>
        <Button label={words.account.signOut} isBusy={leave.isBusy} onPress={() => void signOut(false)} />
        <Button
          kind="danger"
          hasPopup="dialog"
          label={words.account.signOutEverywhere}
          onPress={() => setAsking(true)}
        />
      </View>
      <Dialog
        title={words.account.signOutEverywhereAsk}
        isOpen={isAsking}
        onClose={() => setAsking(false)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setAsking(false)} />
            <Button
              kind="danger"
              label={words.account.signOutEverywhere}
              isBusy={leave.isBusy}
              onPress={() => void signOut(true)}
            />
          </>
        }
      >
        <Txt>{words.account.signOutEverywhereMore}</Txt>
      </Dialog>
    </Section>
  )
}
