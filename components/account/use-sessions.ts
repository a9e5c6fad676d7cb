import { useCallback, useEffect, useState } from 'react'
import type { Refusal } from '@/components/api'
import { auth, type ListedSession } from '@/components/session'

export type Sessions = Readonly<{
  list: readonly ListedSession[] | null
  currentId: string | null
  refusal: Refusal | null
  reload: () => void
}>

const idOfCurrent = (answer: unknown): string | null => {
  const id = (answer as { session?: { id?: unknown } } | null)?.session?.id
  return typeof id === 'string' ? id : null
}

/** The sessions of this person, the newest first, and which of them is this one. */
export function useSessions(): Sessions {
  const [state, setState] = useState<Omit<Sessions, 'reload'>>({ list: null, currentId: null, refusal: null })
  const [turn, setTurn] = useState(0)
  useEffect(() => {
    let isWanted = true
    void Promise.all([auth.listSessions(), auth.current()]).then(([listed, current]) => {
      if (!isWanted) return
      if (!listed.ok) return setState((before) => ({ ...before, refusal: listed.reason }))
      setState({
        list: [...listed.value].sort((a, b) => b.updatedAt.localeCompare(a.updatedAt)),
        currentId: current.ok ? idOfCurrent(current.value) : null,
        refusal: null,
      })
    })
    return () => {
      isWanted = false
    }
  }, [turn])
  return { ...state, reload: useCallback(() => setTurn((before) => before + 1), []) }
}
