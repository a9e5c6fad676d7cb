import { useWindowDimensions } from 'react-native'
import { WIDE_PX } from './scale'

/** The window's width, and whether it is wide enough to lay things side by side. */
export function useWidth(): Readonly<{ widthPx: number; isWide: boolean }> {
  const { width } = useWindowDimensions()
  return { widthPx: width, isWide: width >= WIDE_PX }
}
