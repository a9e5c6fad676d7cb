import { useLayoutEffect } from 'react'

/** For a face that fills the window and never scrolls as a page: no room is kept for a scrollbar. */
export function useWholeWindow(): void {
  useLayoutEffect(() => {
    const { style } = document.documentElement
    style.setProperty('scrollbar-gutter', 'auto')
    return () => {
      style.removeProperty('scrollbar-gutter')
    }
  }, [])
}
