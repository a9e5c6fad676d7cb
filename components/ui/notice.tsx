import type { ReactNode } from 'react'
import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { Lozenge } from './lozenge'
import { Txt, type Tone } from './txt'

const TONES: Readonly<Record<'good' | 'bad' | 'note', Tone>> = {
  good: 'verdigris',
  bad: 'minium',
  note: 'orpiment',
}

/** A rubric: something the page has to say, in the margin's colour, with its shape. Bad news interrupts, the rest waits. */
export function Notice({
  kind = 'note',
  title,
  children,
  action,
}: Readonly<{ kind?: 'good' | 'bad' | 'note'; title: string; children?: ReactNode; action?: ReactNode }>) {
  const { colors } = useTheme()
  const tone = TONES[kind]
  return (
    <View
      role={kind === 'bad' ? 'alert' : 'status'}
      style={{
        backgroundColor: colors.leaf,
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        paddingVertical: space.half,
        paddingHorizontal: space.one,
        flexDirection: 'row',
        gap: space.half,
      }}
    >
      <View style={{ paddingTop: 6 }}>
        <Lozenge kind={kind === 'note' ? 'hollow' : 'filled'} tone={tone} />
      </View>
      <View style={{ flex: 1, gap: space.small, minWidth: 0 }}>
        <View>
          <Txt face="serif" isStrong tone={tone}>
            {title}
          </Txt>
          {typeof children === 'string' ? <Txt>{children}</Txt> : children}
        </View>
        {action}
      </View>
    </View>
  )
}
