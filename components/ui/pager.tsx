import { View } from 'react-native'
import { space } from '@/components/theme'
import { useWords } from '@/components/words'
import { Button } from './button'
import { Txt } from './txt'

/** Where one is in a long list, and the way on. Hidden while everything fits on one page. */
export function Pager({
  offset,
  shown,
  total,
  pageSize,
  onGo,
}: Readonly<{
  offset: number
  shown: number
  total: number
  pageSize: number
  onGo: (offset: number) => void
}>) {
  const words = useWords().common
  if (total <= pageSize && offset === 0) return null
  return (
    <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.one, flexWrap: 'wrap' }}>
      <Button
        label={words.earlier}
        isDisabled={offset === 0}
        onPress={() => onGo(Math.max(0, offset - pageSize))}
      />
      <Txt kind="note" tone="lead" isTabular role="status">
        {words.showing(total === 0 ? 0 : offset + 1, offset + shown, total)}
      </Txt>
      <Button
        label={words.later}
        isDisabled={offset + shown >= total}
        onPress={() => onGo(offset + pageSize)}
      />
    </View>
  )
}
