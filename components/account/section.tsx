import { useId, type ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme, useWidth } from '@/components/theme'
import { Heading } from '@/components/ui'

/** A part of a page of settings: its name in the margin where there is one, above it on a phone. */
export function Section({ title, children }: Readonly<{ title: string; children: ReactNode }>) {
  const { colors } = useTheme()
  const { isWide } = useWidth()
  const id = useId()
  return (
    <View
      role="region"
      aria-labelledby={id}
      style={{
        borderTopWidth: 1,
        borderColor: colors.hairline,
        paddingTop: space.one,
        flexDirection: isWide ? 'row' : 'column',
        columnGap: space.triple,
        rowGap: space.half,
      }}
    >
      <View style={isWide ? { width: 220, flexShrink: 0 } : null}>
        <Heading level={2} id={id}>
          {title}
        </Heading>
      </View>
      <View style={{ flex: isWide ? 1 : undefined, minWidth: 0, maxWidth: 620, gap: space.one }}>
        {children}
      </View>
    </View>
  )
}
