import { useSyncExternalStore } from 'react'
import { WIDE_PX } from './scale'

/** Of the page itself: the window's own width counts a scroll bar that takes its room from the page. */
const readWidthPx = (): number => document.documentElement.offsetWidth

function subscribe(tell: () => void): () => void {
  const observer = new ResizeObserver(tell)
  observer.observe(document.documentElement)
  return () => observer.disconnect()
}

/** The page's width, and whether it is wide enough to lay things side by side. */
export function useWidth(): Readonly<{ widthPx: number; isWide: boolean }> {
  const widthPx = useSyncExternalStore(subscribe, readWidthPx, () => WIDE_PX)
  return { widthPx, isWide: widthPx >= WIDE_PX }
}
