import type { ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { usePageMeasure } from './use-page-measure'

/** Content with a margin of rubrics: at its right where there is room, below it on a phone. */
export function Beside({ children, margin }: Readonly<{ children: ReactNode; margin: ReactNode }>) {
  const { colors } = useTheme()
  const { besidePx, contentPx } = usePageMeasure()
  if (besidePx === 0) {
    return (
      <View style={{ gap: space.double }}>
        {children}
        {margin}
      </View>
    )
  }
  return (
    <View style={{ flexDirection: 'row', columnGap: space.wide }}>
      <View style={{ width: contentPx - besidePx, minWidth: 0 }}>{children}</View>
      <View
        style={{
          width: besidePx - space.wide,
          borderLeftWidth: 1,
          borderColor: colors.hairline,
          paddingLeft: space.wide,
        }}
      >
        {margin}
      </View>
    </View>
  )
}
