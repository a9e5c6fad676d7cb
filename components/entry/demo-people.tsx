import { View } from 'react-native'
import { useQuery } from '@/components/api'
import { space } from '@/components/theme'
import { Button, Heading, LinkText, Name, Row, Rows, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'

/** The demo only: the invented people one may be, a press away. */
export function DemoPeople({
  onChoose,
  chosen,
}: Readonly<{ onChoose: (email: string, password: string) => void; chosen: string }>) {
  const words = useWords().entry
  const query = useQuery(api.demo.people, {})
  const { data } = query
  if (!data) return null
  return (
    <View style={{ gap: space.half }}>
      <View style={{ gap: space.tiny }}>
        <Heading level={2}>{words.signIn.demoTitle}</Heading>
        <Txt tone="lead">{words.signIn.demoLead}</Txt>
        <Txt tone="lead">{words.signIn.demoPassword(data.password)}</Txt>
      </View>
      <Rows label={words.signIn.demoTitle}>
        {data.people.map((person) => (
          <Row
            key={person.email}
            side={
              <Button
                label={words.signIn.demoUse}
                hint={words.signIn.demoFill(person.name)}
                isOn={chosen === person.email}
                onPress={() => onChoose(person.email, data.password)}
              />
            }
          >
            <Txt>
              <Name>{person.name}</Name>
            </Txt>
            <Txt kind="note" tone="lead">
              {`${person.role}, ${person.email}`}
            </Txt>
          </Row>
        ))}
      </Rows>
      <Txt kind="note" tone="lead">
        <LinkText href="/demo/mail" kind="note" label={words.signUp.demoMail} />
      </Txt>
    </View>
  )
}
