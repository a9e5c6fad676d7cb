import type { PlaybackPosition, Timeline } from './playback'

/**
 * Where a hearing stands after so many seconds; `null` before it began and once it is over.
 * @example two bars of two seconds: positionAt(timeline, 3) // { bar: 2, fraction: 0.5 }
 */
export function positionAt(timeline: Timeline, seconds: number): PlaybackPosition | null {
  if (!(seconds >= 0 && seconds < timeline.totalSeconds)) return null
  // Every bar lasts as long as the others, but a sum of floats may fall a hair short of the edge of the last.
  const found = timeline.bars.findLast((bar) => bar.startSeconds <= seconds)
  if (!found) return null
  const fraction = (seconds - found.startSeconds) / found.durationSeconds
  return { bar: found.bar, fraction: Math.min(fraction, 1 - Number.EPSILON) }
}
