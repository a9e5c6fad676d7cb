import { useMemo } from 'react'
import { View } from 'react-native'
import { Score } from '@/components/score'
import { space, useWidth } from '@/components/theme'
import { Txt, usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import { firstExercise } from './first-exercise'

/** The piece the place is named after, engraved as every score here is. */
export function Bicinium() {
  const words = useWords().entry.landing
  const { isWide } = useWidth()
  const { contentPx } = usePageMeasure()
  const input = useMemo(() => firstExercise(words.gestures), [words])
  return (
    <View style={{ gap: space.small }}>
      <Score
        input={input}
        size="page"
        width={contentPx}
        maxHeight={420}
        accessibilityLabel={words.pictureLabel}
      />
      <Txt kind={isWide ? 'note' : 'small'} tone="lead" face="italic">
        {words.pictureCaption}
      </Txt>
    </View>
  )
}
