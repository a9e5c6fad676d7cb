import type { ReactNode } from 'react'
import { Text, type StyleProp, type TextStyle } from 'react-native'
import { fonts, leading, type, useTheme, type Pigment } from '@/components/theme'

export type TxtKind = keyof typeof type
export type Tone = Exclude<Pigment, 'hairline' | 'edge'>

const SERIF_FROM: readonly TxtKind[] = ['title', 'large', 'head', 'wall']

export type TxtProps = Readonly<{
  children?: ReactNode
  /** Size by name: 13 15 17 21 27 35 56. From `title` upward it is set in the serif. */
  kind?: TxtKind
  tone?: Tone
  face?: 'sans' | 'serif' | 'italic'
  /** Medium weight. */
  isStrong?: boolean
  /** Figures of one width, for columns. */
  isTabular?: boolean
  align?: 'left' | 'right' | 'center'
  /** Cuts the text to so many lines. */
  lines?: number
  id?: string
  role?: 'paragraph' | 'status' | 'alert' | 'none'
  'aria-hidden'?: boolean
  'aria-live'?: 'polite' | 'assertive'
  style?: StyleProp<TextStyle>
}>

/** The style of a run of text, for the few places that cannot use `Txt`. */
export function useTxtStyle({
  kind = 'text',
  tone = 'lampblack',
  face,
  isStrong = false,
  isTabular = false,
  align,
}: TxtProps): TextStyle {
  const { colors } = useTheme()
  const isSerif = face ? face !== 'sans' : SERIF_FROM.includes(kind)
  const family =
    face === 'italic'
      ? fonts.AlegreyaItalic
      : isSerif
        ? isStrong || !face
          ? fonts.AlegreyaMedium
          : fonts.Alegreya
        : isStrong
          ? fonts.AlegreyaSansMedium
          : fonts.AlegreyaSans
  return {
    fontFamily: family,
    fontSize: type[kind],
    lineHeight: leading[kind],
    color: colors[tone],
    ...(isTabular ? { fontVariant: ['tabular-nums', 'lining-nums'] } : {}),
    ...(align ? { textAlign: align } : {}),
  }
}

/** A run of text in one of the seven sizes. */
export function Txt(props: TxtProps) {
  const { children, lines, id, role, style } = props
  const base = useTxtStyle(props)
  return (
    <Text
      id={id}
      role={role as never}
      aria-live={props['aria-live']}
      aria-hidden={props['aria-hidden']}
      numberOfLines={lines}
      style={[base, style]}
    >
      {children}
    </Text>
  )
}
