import { useCallback, useMemo, useState } from 'react'
import {
  draftOf,
  isComplete,
  notesOfDraft,
  rhythmChoices,
  startDraft,
  type BarDraft,
} from '@/components/ladder/bar-draft'
import type { DeskBar } from '@/components/lesson/desk-bars'
import type { LessonView } from '@/components/lesson/lesson-view'
import type { BarNotes, Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

type Drafts = Readonly<Record<number, BarDraft>>
const NONE: Drafts = {}

/**
 * Bars that are being written note by note. A bar goes to the sheet, and so before the class, when its last note is
 * there; until then it is kept on this device.
 */
export function useBarDrafts(view: LessonView) {
  const [drafts, setDrafts] = useState<Drafts>(NONE)

  const unfinished = useMemo(() => {
    const line: Record<number, BarNotes> = {}
    for (const [bar, draft] of Object.entries(drafts)) {
      if (isComplete(draft)) continue
      const notes = notesOfDraft(draft)
      if (notes.length > 0) line[Number(bar)] = notes
    }
    return line
  }, [drafts])

  const draftAt = useCallback(
    (bar: number, read: DeskBar | undefined, own: Line): BarDraft => {
      const kept = drafts[bar]
      const written = read?.kind === 'open' ? read.notes : null
      if (written) return draftOf(written, kept?.place ?? null)
      if (kept && !isComplete(kept)) return kept
      const [usual] = rhythmChoices(view.exercise.species, bar, view.barCount)
      const before = own[bar - 1] ?? view.line[bar - 1]
      return startDraft(
        usual as NonNullable<typeof usual>,
        view.setAside.has(bar - 1) ? null : heldFrom(before),
      )
    },
    [drafts, view],
  )

  const keep = useCallback((bar: number, draft: BarDraft) => {
    setDrafts((before) => ({ ...before, [bar]: draft }))
  }, [])

  return { unfinished, draftAt, keep }
}

const heldFrom = (notes: BarNotes | undefined): PitchName | null => {
  const last = notes?.at(-1)
  return last?.tied ? last.pitch : null
}
