import { View } from 'react-native'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { formatWays } from './format-ways'
import type { WaysAnswer } from './ways-messages'

const FIGURE_PX = 104

/** How many ways a proposal leaves, or where it is stuck. Its place is kept while it is counted. */
export function WaysFigure({ ways, isWide }: Readonly<{ ways: WaysAnswer | null; isWide: boolean }>) {
  const words = useWords().ways
  const isStuck = ways !== null && ways.deadEnd !== null
  return (
    <View
      style={
        isWide
          ? { width: FIGURE_PX, alignItems: 'flex-end', minHeight: 48 }
          : { flexDirection: 'row', alignItems: 'baseline', gap: 6, minHeight: 28 }
      }
    >
      <Txt kind="title" isTabular>
        {ways ? formatWays(ways) : ' '}
      </Txt>
      <Txt kind="note" tone="lead" align={isWide ? 'right' : undefined}>
        {ways === null
          ? words.counting
          : isStuck && ways.deadEnd
            ? words.stuckAt(ways.deadEnd.bar)
            : words.left(ways.count === '1')}
      </Txt>
    </View>
  )
}
