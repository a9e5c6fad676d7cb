import { useEffect } from 'react'

/** Names the browser's tab while this screen is shown; screen readers tell it when the page changes. */
export function useTitle(title: string): void {
  useEffect(() => {
    document.title = title.trim() === '' ? 'Bicinium' : `${title} · Bicinium`
  }, [title])
}
