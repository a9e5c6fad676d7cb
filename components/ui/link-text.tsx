import { Link, type Href } from 'expo-router'
import type { ReactNode } from 'react'
import { View, type StyleProp, type TextStyle } from 'react-native'
import { CORNER_PX, fonts, leading, RULE_PX, space, type, useTarget, useTheme } from '@/components/theme'
import { useTxtStyle, type Tone, type TxtKind } from './txt'

/** A link in the run of a text. */
export function LinkText({
  href,
  label,
  kind = 'text',
  tone = 'azurite',
  face,
  isStrong,
  isCurrent,
  children,
  style,
}: Readonly<{
  href: string
  /** Its words; `children` when they hold a name. */
  label?: string
  kind?: TxtKind
  tone?: Tone
  face?: 'sans' | 'serif'
  isStrong?: boolean
  isCurrent?: boolean
  children?: ReactNode
  style?: StyleProp<TextStyle>
}>) {
  const base = useTxtStyle({ kind, tone, face, isStrong })
  return (
    <Link
      href={href as Href}
      {...(isCurrent ? { 'aria-current': 'page' } : {})}
      style={[
        base,
        { textDecorationLine: 'underline', textDecorationThickness: 1, textUnderlineOffset: 3 } as TextStyle,
        style,
      ]}
    >
      {children ?? label}
    </Link>
  )
}

/** A link that looks and measures like a button: it goes somewhere, so it is a link to every reader. */
export function LinkButton({
  href,
  label,
  kind = 'plain',
  isWide = false,
}: Readonly<{ href: string; label: string; kind?: 'plain' | 'go'; isWide?: boolean }>) {
  const { colors } = useTheme()
  const target = useTarget()
  return (
    <View style={{ alignSelf: isWide ? 'stretch' : 'flex-start' }}>
      <Link
        href={href as Href}
        style={
          {
            display: 'flex',
            alignItems: 'center',
            justifyContent: 'center',
            minHeight: target.heightPx,
            paddingInline: space.one - 2,
            paddingBlock: space.tiny,
            borderWidth: RULE_PX,
            borderStyle: 'solid',
            borderRadius: CORNER_PX,
            borderColor: kind === 'go' ? colors.verdigris : colors.edge,
            backgroundColor: kind === 'go' ? colors.verdigris : 'transparent',
            color: kind === 'go' ? colors.vellum : colors.lampblack,
            fontFamily: fonts.AlegreyaSansMedium,
            fontSize: type[target.kind],
            lineHeight: leading[target.kind],
            textAlign: 'center',
            textDecorationLine: 'none',
          } as unknown as TextStyle
        }
      >
        {label}
      </Link>
    </View>
  )
}
