import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { Heading, Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'

export type KeptState = 'kept' | 'sending' | 'waiting'

/** What is open, whether all that was written is kept, and how many are in the room. */
export function DeskHeader({
  released,
  kept,
  here,
}: Readonly<{ released: readonly number[]; kept: KeptState; here: number | null }>) {
  const words = useWords()
  const { colors } = useTheme()
  const title = released.length > 0 ? words.desk.titleReleased(released) : words.desk.titleNone
  return (
    <View
      style={{
        minHeight: 52,
        flexDirection: 'row',
        alignItems: 'center',
        gap: space.half,
        paddingHorizontal: space.one,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
      }}
    >
      <Lozenge
        tone={released.length > 0 ? 'azurite' : 'lead'}
        kind={released.length > 0 ? 'filled' : 'hollow'}
      />
      <Heading level={1} kind="title" style={{ flex: 1, minWidth: 0 }}>
        {title}
      </Heading>
      <View role="status" aria-label={words.desk.keptSpoken[kept]} style={{ alignItems: 'flex-end' }}>
        <Txt kind="note" tone={kept === 'waiting' ? 'orpiment' : 'lead'} isTabular align="right">
          {kept === 'waiting' || here === null
            ? words.desk[kept]
            : `${words.desk[kept]} · ${words.desk.here(here)}`}
        </Txt>
      </View>
    </View>
  )
}
