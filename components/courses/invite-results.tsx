import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { Lozenge, Name, Txt } from '@/components/ui'
import { useWords } from '@/components/words'

type Results = Readonly<{
  sent: readonly string[]
  already: readonly string[]
  refused: readonly Readonly<{ text: string; why: 'not-an-address' | 'mail-failed' }>[]
}>

/** What became of each pasted address, the refused ones first. */
export function InviteResults({ results }: Readonly<{ results: Results }>) {
  const words = useWords().courses.invite
  const { colors } = useTheme()
  const { sent, already, refused } = results
  const lines = [
    ...refused.map(({ text, why }) => ({ text, tone: 'minium' as const, says: words.why[why] })),
    ...already.map((text) => ({ text, tone: 'lead' as const, says: words.resultAlready })),
    ...sent.map((text) => ({ text, tone: 'verdigris' as const, says: words.resultSent })),
  ]
  const summary = [
    sent.length > 0 ? words.sent(sent.length) : null,
    already.length > 0 ? words.already(already.length) : null,
    refused.length > 0 ? words.refused(refused.length) : null,
  ]
  return (
    <View style={{ gap: space.small }}>
      <Txt role="status" isStrong>
        {summary.filter((part) => part !== null).join(' ')}
      </Txt>
      <View
        role="list"
        aria-label={words.results}
        style={{
          maxHeight: 208,
          overflow: 'scroll',
          borderTopWidth: 1,
          borderBottomWidth: 1,
          borderColor: colors.hairline,
        }}
      >
        {lines.map(({ text, tone, says }) => (
          <View
            role="listitem"
            key={`${says} ${text}`}
            style={{ flexDirection: 'row', alignItems: 'center', gap: space.half, minHeight: 30 }}
          >
            <Lozenge kind={tone === 'lead' ? 'hollow' : 'filled'} tone={tone} sizePx={9} />
            <Txt kind="note" style={{ flexShrink: 1 }}>
              <Name>{text}</Name>
            </Txt>
            <Txt kind="note" tone={tone}>
              {says}
            </Txt>
          </View>
        ))}
      </View>
    </View>
  )
}
