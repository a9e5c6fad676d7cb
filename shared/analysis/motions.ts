import { readStretches, type Sonority } from '@/shared/analysis/sonorities'
import type { SetAside } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import { motionBetween, type Motion } from '@/shared/theory/motion'
import type { Line } from '@/shared/theory/note'

/** The move from one bar into the next that is read; `still` where neither voice moves. */
export type MotionInto = Readonly<{ fromBar: number; bar: number; motion: Motion | 'still' }>

/** How often the voices move in each way, and which share of all moves that is, from 0 to 1. */
export type MotionShares = Readonly<{
  moves: number
  counts: Readonly<Record<MotionInto['motion'], number>>
  /** All 0 where nothing moves. */
  shares: Readonly<Record<MotionInto['motion'], number>>
}>

/**
 * The motion into every bar: from the last sonority of the bar before. Inside a bar the cantus stays, and the motion is
 * oblique whatever the line does, which says something of the species and nothing of the writer.
 */
export const listMotions = (exercise: Exercise, line: Line, setAside?: SetAside): readonly MotionInto[] =>
  readStretches(exercise, line, setAside).flatMap((stretch) =>
    stretch.flatMap((now, index) => {
      const before = stretch[index - 1]
      return before === undefined || before.bar === now.bar ? [] : [motionInto(before, now)]
    }),
  )

function motionInto(before: Sonority, now: Sonority): MotionInto {
  const motion = motionBetween(before.cantus, now.cantus, before.line, now.line)
  return { fromBar: before.bar, bar: now.bar, motion: motion ?? 'still' }
}

/** Counts motions. Fux’s first solution in Dorian (figure 5) moves contrary or obliquely six times in ten. */
export function shareMotions(motions: readonly MotionInto[]): MotionShares {
  const counts = { contrary: 0, oblique: 0, similar: 0, parallel: 0, still: 0 }
  for (const { motion } of motions) counts[motion] += 1
  const moves = motions.length
  const shareOf = (count: number) => (moves === 0 ? 0 : count / moves)
  return {
    moves,
    counts,
    shares: {
      contrary: shareOf(counts.contrary),
      oblique: shareOf(counts.oblique),
      similar: shareOf(counts.similar),
      parallel: shareOf(counts.parallel),
      still: shareOf(counts.still),
    },
  }
}
