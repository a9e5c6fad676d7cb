import { useMemo } from 'react'
import type { BoardState } from '@/shared/board'
import { createJudge, type Judge } from './judge'
import { viewOf, type LessonView } from './lesson-view'

/** A board read for a face, and the judge of its present line: both made anew only when the board changes. */
export function useLessonView(board: BoardState): Readonly<{ view: LessonView; judge: Judge }> {
  const view = useMemo(() => viewOf(board), [board])
  const judge = useMemo(() => createJudge(view.checker, view.line, view.setAside), [view])
  return { view, judge }
}
