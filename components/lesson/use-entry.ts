import { useCallback, useEffect, useState } from 'react'
import { callApi, type Refusal } from '@/components/api'
import { api } from '@/shared/api'
import type { Lesson, LessonRole } from '@/shared/api/lessons'

/** Who one is in a lesson, as the server says. */
export type Entry = Readonly<{ lesson: Lesson; role: LessonRole; memberId: string | null; name: string }>

export type EntryState = Readonly<
  { status: 'entering' } | { status: 'refused'; refusal: Refusal } | { status: 'in'; entry: Entry }
>

/** Enters a lesson and stays informed: `reload` asks again, keeping what is known in sight meanwhile. */
export function useEntry(lessonId: string): Readonly<{
  state: EntryState
  reload: () => void
  setLesson: (lesson: Lesson) => void
}> {
  const [state, setState] = useState<EntryState>({ status: 'entering' })
  const [turn, setTurn] = useState(0)
  useEffect(() => {
    let isCurrent = true
    callApi(api.lessons.enter, { params: { lessonId } }).then(
      (result) => {
        if (!isCurrent) return
        setState((before) => {
          if (result.ok) return { status: 'in', entry: result.value }
          if (before.status !== 'in') return { status: 'refused', refusal: result.reason }
          // Who is in stays in: the room itself says when it closes, and why. A weak connection puts nobody out.
          if (result.reason.code !== 'ended') return before
          return {
            status: 'in',
            entry: { ...before.entry, lesson: { ...before.entry.lesson, status: 'ended' } },
          }
        })
      },
      () => undefined,
    )
    return () => {
      isCurrent = false
    }
  }, [lessonId, turn])
  const reload = useCallback(() => setTurn((before) => before + 1), [])
  const setLesson = useCallback(
    (lesson: Lesson) =>
      setState((before) =>
        before.status === 'in' ? { status: 'in', entry: { ...before.entry, lesson } } : before,
      ),
    [],
  )
  return { state, reload, setLesson }
}
