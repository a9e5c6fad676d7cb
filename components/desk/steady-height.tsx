import { useRef, type ReactNode } from 'react'
import { View } from 'react-native'

/** Keeps the tallest height its content has had, so that what is below never jumps back and forth. */
export function SteadyHeight({ children }: Readonly<{ children: ReactNode }>) {
  const view = useRef<View>(null)
  const tallestPx = useRef(0)
  return (
    <View
      ref={view}
      onLayout={({ nativeEvent }) => {
        const { height } = nativeEvent.layout
        if (height <= tallestPx.current) return
        tallestPx.current = height
        const element = view.current as unknown as HTMLElement | null
        if (element) element.style.minHeight = `${height}px`
      }}
    >
      {children}
    </View>
  )
}
