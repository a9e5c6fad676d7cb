import type { ReactNode } from 'react'
import { Text, type StyleProp, type TextStyle } from 'react-native'
import { useTxtStyle, type Tone, type TxtKind } from './txt'

const KIND_OF_LEVEL: Readonly<Record<1 | 2 | 3, TxtKind>> = { 1: 'head', 2: 'title', 3: 'text' }

/** A heading of level 1 to 3, in the serif. `kind` overrides the size that goes with the level. */
export function Heading({
  level,
  kind = KIND_OF_LEVEL[level],
  tone,
  id,
  children,
  style,
}: Readonly<{
  level: 1 | 2 | 3
  kind?: TxtKind
  tone?: Tone
  id?: string
  children: ReactNode
  style?: StyleProp<TextStyle>
}>) {
  const base = useTxtStyle({ kind, tone, face: 'serif', isStrong: true })
  return (
    <Text role="heading" aria-level={level} id={id} style={[base, style]}>
      {children}
    </Text>
  )
}
