import { useMemo, useState } from 'react'
import { View } from 'react-native'
import { Score } from '@/components/score'
import { space, useWidth } from '@/components/theme'
import { Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { firstExercise } from './first-exercise'

/** The piece the place is named after, engraved as every score here is. */
export function Bicinium() {
  const words = useWords().entry.landing
  const { isWide } = useWidth()
  const [widthPx, setWidthPx] = useState<number | null>(null)
  const input = useMemo(() => firstExercise(words.gestures), [words])
  return (
    <View style={{ gap: space.small }} onLayout={(event) => setWidthPx(event.nativeEvent.layout.width)}>
      {widthPx === null ? null : (
        <Score
          input={input}
          size="page"
          width={widthPx}
          maxHeight={420}
          accessibilityLabel={words.pictureLabel}
        />
      )}
      <Txt kind={isWide ? 'note' : 'small'} tone="lead" face="italic">
        {words.pictureCaption}
      </Txt>
    </View>
  )
}
