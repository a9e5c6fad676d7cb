import { useCallback, useEffect, useMemo, useState } from 'react'
import { readDraft, writeDraft, type CantusDraft } from './draft'
import { judgeDraft, type JudgedDraft } from './judge-draft'

export type DraftState = Readonly<{
  draft: CantusDraft
  judged: JudgedDraft
  /** Whether what is shown is an unfinished draft found in this browser. */
  isFound: boolean
  isChanged: boolean
  change: (some: Partial<CantusDraft>) => void
  /** Back to what is kept, or to an empty page. */
  discard: () => void
  /** The draft is kept on the server now: forget the copy. */
  forget: () => void
}>

/** A cantus being written, kept in this browser at every change until the server has it. */
export function useDraft(id: string, start: CantusDraft): DraftState {
  const [found] = useState(() => readDraft(id))
  const [draft, setDraft] = useState(found ?? start)
  const [isFound, setFound] = useState(found !== null)
  const [isChanged, setChanged] = useState(found !== null)

  useEffect(() => {
    if (isChanged) writeDraft(id, draft)
  }, [id, draft, isChanged])

  const change = useCallback((some: Partial<CantusDraft>) => {
    setChanged(true)
    setDraft((before) => ({ ...before, ...some }))
  }, [])
  const forget = useCallback(() => {
    setChanged(false)
    setFound(false)
    writeDraft(id, null)
  }, [id])
  const discard = useCallback(() => {
    forget()
    setDraft(start)
  }, [forget, start])
  const judged = useMemo(() => judgeDraft(draft), [draft])
  return { draft, judged, isFound, isChanged, change, discard, forget }
}
