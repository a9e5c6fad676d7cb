import { useEffect } from 'react'

/** Of the page shown last, for telling an arrival from a first loading and from drawing anew. */
let lastPath: string | null = null
let hasArrived = false
let isBack = false
if (typeof window !== 'undefined') {
  window.addEventListener('popstate', () => {
    isBack = true
  })
}

/**
 * What a browser does by itself when it loads a page, for pages that are drawn in place: the top comes into sight and
 * the reading place moves to the content. Going back keeps the browser's own place.
 */
export function useArrival(mainId: string): void {
  useEffect(() => {
    const path = window.location.pathname
    const isNew = lastPath !== null && lastPath !== path
    if (isNew) {
      hasArrived = true
      if (!isBack) window.scrollTo(0, 0)
      isBack = false
    }
    lastPath = path
    // Only when nothing else holds the focus: a field made to be typed in keeps it.
    const isLost = document.activeElement === null || document.activeElement === document.body
    const main = document.getElementById(mainId)
    if (!hasArrived || !isLost || !main) return
    main.tabIndex = -1
    main.focus({ preventScroll: true })
  }, [mainId])
}
