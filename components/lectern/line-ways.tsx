import { View } from 'react-native'
import { Txt } from '@/components/ui'
import { formatWays } from '@/components/ways/format-ways'
import type { WaysAnswer } from '@/components/ways/ways-messages'
import { useWords } from '@/components/words'
import { findRule } from '@/shared/rules'

/** In how many ways the class's line may be finished by the laws of the lesson, or why it cannot be. */
export function LineWays({ ways }: Readonly<{ ways: WaysAnswer | null }>) {
  const words = useWords().ways
  const titles = (ways?.deadEnd?.rules ?? []).map((id) => findRule(id)?.explain.title ?? id)
  return (
    <View role="status" style={{ minHeight: 24 }}>
      <Txt kind="note" tone={ways?.deadEnd ? 'minium' : 'lead'} isTabular>
        {ways === null
          ? words.counting
          : ways.deadEnd
            ? words.stuckBecause(ways.deadEnd.bar, titles)
            : words.ofLine(formatWays(ways), ways.count === '1')}
      </Txt>
    </View>
  )
}
