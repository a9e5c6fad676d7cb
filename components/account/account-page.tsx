import { View } from 'react-native'
import { Frame } from '@/components/session'
import { GROUNDS, space, useTheme } from '@/components/theme'
import { Choice, Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { Password } from './password'
import { Section } from './section'
import { SessionList } from './session-list'
import { useSessions } from './use-sessions'
import { You } from './you'

/** Everything a person can see and change about themself. */
export function AccountPage({ me }: Readonly<{ me: Me }>) {
  const words = useWords().account
  const { ground, setGround } = useTheme()
  const sessions = useSessions()
  return (
    <Frame me={me} title={words.title}>
      <You me={me} />
      <Section title={words.ground}>
        <Choice
          label={words.groundLabel}
          value={ground}
          onChange={setGround}
          options={GROUNDS.map((value) => ({ value, label: words.grounds[value] }))}
        />
        <Txt kind="note" tone="lead">
          {words.groundHint}
        </Txt>
      </Section>
      <Password onChanged={sessions.reload} />
      <SessionList {...sessions} />
      <Section title={words.kept}>
        <View role="list" style={{ gap: space.small }}>
          {words.keptItems.map((item) => (
            <View role="listitem" key={item} style={{ flexDirection: 'row', gap: space.half }}>
              <View style={{ paddingTop: 8 }}>
                <Lozenge kind="hollow" tone="lead" sizePx={9} />
              </View>
              <Txt style={{ flexShrink: 1 }}>{item}</Txt>
            </View>
          ))}
        </View>
        <Txt tone="lead">{words.removal}</Txt>
      </Section>
    </Frame>
  )
}
