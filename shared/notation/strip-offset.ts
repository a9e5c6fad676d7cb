import type { ScoreLayout } from '@/shared/notation/score-layout'

/**
 * How far a strip is moved to the left so that a bar stands in the middle of what shows beside the clefs, in px. The
 * strip never shows more than its own beginning and end.
 */
export function stripOffsetPx(layout: ScoreLayout, handBar: number | null, windowPx: number): number {
  const system = layout.systems[0]
  const bar = system?.bars.find(({ number }) => number === handBar)
  if (!system || !bar) return 0
  const middle = system.prefixPx + (windowPx - system.prefixPx) / 2
  const wanted = bar.xPx + bar.widthPx / 2 - middle
  return Math.round(Math.min(Math.max(wanted, 0), Math.max(0, system.widthPx - windowPx)))
}
