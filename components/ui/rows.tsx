import type { ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'

/** A list ruled like a page: hairlines between, a firm line above. */
export function Rows({
  label,
  children,
  isOpen = false,
}: Readonly<{
  label: string
  children: ReactNode
  /** Without the line above: under something that draws one. */
  isOpen?: boolean
}>) {
  const { colors } = useTheme()
  return (
    <View
      role="list"
      aria-label={label}
      style={{ borderTopWidth: isOpen ? 0 : 1.5, borderColor: colors.lampblack }}
    >
      {children}
    </View>
  )
}

/** One line of `Rows`: what it is at the left, what can be done at the right, below it on a narrow screen. */
export function Row({ children, side }: Readonly<{ children: ReactNode; side?: ReactNode }>) {
  const { colors } = useTheme()
  return (
    <View
      role="listitem"
      style={{
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        paddingVertical: space.half,
        flexDirection: 'row',
        flexWrap: 'wrap',
        alignItems: 'center',
        columnGap: space.wide,
        rowGap: space.small,
        minHeight: 68,
      }}
    >
      <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 190, minWidth: 0 }}>{children}</View>
      {side ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small, maxWidth: '100%' }}>
          {side}
        </View>
      ) : null}
    </View>
  )
}
