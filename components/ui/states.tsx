import { useEffect, useState, type ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { useWords } from '@/components/words'
import { Button } from './button'
import { Heading } from './heading'
import { LinkText } from './link-text'
import { Lozenge } from './lozenge'
import { Txt } from './txt'

const PATIENCE_MS = 4000

/** A place kept for what is coming: so many lines of it, and a word once it takes long. */
export function Loading({ lines = 4, heightPx = 52 }: Readonly<{ lines?: number; heightPx?: number }>) {
  const { colors } = useTheme()
  const words = useWords().common
  const [isLong, setLong] = useState(false)
  useEffect(() => {
    const timer = setTimeout(() => setLong(true), PATIENCE_MS)
    return () => clearTimeout(timer)
  }, [])
  return (
    <View aria-busy role="status" aria-label={words.loading}>
      {Array.from({ length: lines }, (_, line) => (
        <View
          key={line}
          style={{
            height: heightPx,
            borderBottomWidth: 1,
            borderColor: colors.hairline,
            justifyContent: 'center',
          }}
        >
          {line === 0 && isLong ? (
            <Txt kind="note" tone="lead">
              {words.stillLoading}
            </Txt>
          ) : (
            <View
              style={{
                height: 10,
                width: `${56 - ((line * 17) % 31)}%`,
                backgroundColor: colors.hairline,
                opacity: 0.6,
              }}
            />
          )}
        </View>
      ))}
    </View>
  )
}

/** Nothing here yet, what would be here, and how to put it here. */
export function Empty({
  title,
  children,
  action,
}: Readonly<{ title: string; children?: ReactNode; action?: ReactNode }>) {
  const { colors } = useTheme()
  return (
    <View
      style={{
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        paddingVertical: space.wide,
        gap: space.half,
      }}
    >
      <View style={{ gap: space.tiny }}>
        <Txt face="serif" isStrong kind="title">
          {title}
        </Txt>
        {typeof children === 'string' ? <Txt tone="lead">{children}</Txt> : children}
      </View>
      {action}
    </View>
  )
}

/** A request was refused or failed: what happened, what to do, and a way on. */
export function Refused({
  title,
  children,
  onRetry,
  href,
  linkLabel,
  level = 2,
}: Readonly<{
  title: string
  children?: ReactNode
  onRetry?: () => void
  href?: string
  linkLabel?: string
  level?: 1 | 2
}>) {
  const words = useWords().common
  return (
    <View role="alert" style={{ gap: space.half, paddingVertical: space.wide, alignItems: 'flex-start' }}>
      <View style={{ flexDirection: 'row', gap: space.half, alignItems: 'center' }}>
        <Lozenge tone="minium" />
        <Heading level={level} kind="title">
          {title}
        </Heading>
      </View>
      {typeof children === 'string' ? <Txt tone="lead">{children}</Txt> : children}
      {onRetry ? <Button label={words.tryAgain} onPress={onRetry} /> : null}
      {href ? <LinkText href={href} label={linkLabel ?? words.goHome} /> : null}
    </View>
  )
}
