import { useMemo } from 'react'
import type { LessonView } from '@/components/lesson/lesson-view'
import { lineWith, lineWithout } from '@/components/lesson/line-with'
import { useWords } from '@/components/words'
import type { Line } from '@/shared/theory/note'
import { formatPitch, type Pitch } from '@/shared/theory/pitch'
import { formatCount } from './format-ways'
import { useWays } from './use-ways'
import type { WaysQuestion } from './ways-messages'

/**
 * For every rung of the bar in hand, in how many ways the line may be finished from there, in words; null where nothing
 * is to be told. Empty while it is counted, and where the teacher does not let phones be told.
 */
export function useRungWays(
  view: LessonView,
  own: Line,
  bar: number,
  pitches: readonly Pitch[],
): readonly (string | null)[] {
  const words = useWords().ways
  // A rung is a whole bar in first species only; in the others it is one of several notes to come.
  const isTold = view.stage.showsWays === 'everyone' && view.exercise.species === 1
  const questions = useMemo<readonly WaysQuestion[] | null>(
    () =>
      isTold ? [{ key: '', line: lineWithout(lineWith(view.line, own), [bar]), aliveInBar: bar }] : null,
    [isTold, view.line, own, bar],
  )
  const answer = useWays(view, questions)('')
  return useMemo(() => {
    const alive = answer?.alive
    // Counts that were cut short would favour the notes that were counted first.
    if (!alive || !answer.isExact) return []
    return pitches.map((pitch) => {
      const count = alive[formatPitch(pitch)]
      return count === undefined ? null : words.onRung(formatCount(count), count === '1')
    })
  }, [answer, pitches, words])
}
