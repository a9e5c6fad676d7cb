import { useCallback, useSyncExternalStore } from 'react'

/** One list a query: every button asks, at every drawing. */
const lists = new Map<string, MediaQueryList>()

function listOf(query: string): MediaQueryList {
  const known = lists.get(query)
  if (known) return known
  const list = window.matchMedia(query)
  lists.set(query, list)
  return list
}

/** Whether a media query holds, kept up to date. `useMedia('(prefers-color-scheme: dark)')` */
export function useMedia(query: string): boolean {
  const subscribe = useCallback(
    (tell: () => void) => {
      const list = listOf(query)
      list.addEventListener('change', tell)
      return () => list.removeEventListener('change', tell)
    },
    [query],
  )
  return useSyncExternalStore(
    subscribe,
    () => listOf(query).matches,
    () => false,
  )
}
