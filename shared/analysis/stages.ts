import { findGestures, type Gesture } from '@/shared/theory/gestures'
import type { Pitch } from '@/shared/theory/pitch'

/** One stage of a lesson, as a plan proposes it: what the class does, over which bars. Words are the interface's. */
export type ProposedStage = Readonly<{
  kind: 'know-the-cantus' | 'cadence' | 'opening' | 'gesture' | 'whole-by-ear' | 'look-back'
  from: number
  to: number
  /** Of a gesture: its shape in the cantus, and its number from the front. */
  shape?: Gesture['shape']
  number?: number
}>

const CADENCE_BARS = 2

/**
 * Proposes the stages of a lesson from the melody itself: know the cantus; the cadence, then the opening, where the
 * rules leave little choice; its gestures from the end backwards, so that each has somewhere to go; the whole by ear;
 * what could be better. Bars that the cadence and the opening have settled are not in the gestures. Common practice of
 * the classroom, no source.
 */
export function proposeStages(cantus: readonly Pitch[]): readonly ProposedStage[] {
  const last = cantus.length
  if (last <= CADENCE_BARS) return []
  const whole = { from: 1, to: last }
  const cadence = { from: last - CADENCE_BARS + 1, to: last }
  const gestures = findGestures(cantus).flatMap(({ from, to, shape }, index): readonly ProposedStage[] => {
    const open = { from: Math.max(2, from), to: Math.min(cadence.from - 1, to) }
    return open.from > open.to ? [] : [{ kind: 'gesture', ...open, shape, number: index + 1 }]
  })
  return [
    { kind: 'know-the-cantus', ...whole },
    { kind: 'cadence', ...cadence },
    { kind: 'opening', from: 1, to: 1 },
    ...gestures.reverse(),
    { kind: 'whole-by-ear', ...whole },
    { kind: 'look-back', ...whole },
  ]
}
