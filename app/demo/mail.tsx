import { View } from 'react-native'
import { Asked, useQuery } from '@/components/api'
import { MessageText } from '@/components/people/message-text'
import { Frame, useSession } from '@/components/session'
import { MEASURE_PX, space } from '@/components/theme'
import { Button, Empty, Heading, Row, Rows, Txt } from '@/components/ui'
import { formatDateTime, useWords } from '@/components/words'
import { api } from '@/shared/api'

export default function DemoMail() {
  const words = useWords().people.mail
  const { me } = useSession()
  const query = useQuery(api.demo.mail, {})
  return (
    <Frame
      me={me && !me.isGuest ? me : null}
      title={words.title}
      lede={words.lede}
      actions={<Button label={words.refresh} isBusy={query.isReloading} onPress={query.reload} />}
    >
      <Asked query={query}>
        {({ messages }) =>
          messages.length === 0 ? (
            <Empty title={words.none}>{words.noneMore}</Empty>
          ) : (
            <Rows label={words.title}>
              {messages.map((message) => (
                <Row key={message.id}>
                  <View style={{ gap: space.small, maxWidth: MEASURE_PX }}>
                    <View>
                      <Heading level={2}>{message.subject}</Heading>
                      <Txt kind="note" tone="lead" isTabular>
                        {`${words.to(message.to)}, ${formatDateTime(message.sentAt)}`}
                      </Txt>
                    </View>
                    <MessageText text={message.text} />
                  </View>
                </Row>
              ))}
            </Rows>
          )
        }
      </Asked>
    </Frame>
  )
}
