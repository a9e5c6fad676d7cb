import type { BarFrame } from '@/shared/notation/score-layout'

/** The one long system of a strip, as far as moving it goes. */
export type StripFrame = Readonly<{ prefixPx: number; widthPx: number; bars: readonly BarFrame[] }>

/**
 * How far a strip is moved to the left so that a bar stands in the middle of what shows beside the clefs, in px. The
 * strip never shows more than its own beginning and end.
 */
export function stripOffsetPx(strip: StripFrame, handBar: number | null, windowPx: number): number {
  const bar = strip.bars.find(({ number }) => number === handBar)
  if (!bar) return 0
  const middle = strip.prefixPx + (windowPx - strip.prefixPx) / 2
  const wanted = bar.xPx + bar.widthPx / 2 - middle
  return Math.round(Math.min(Math.max(wanted, 0), Math.max(0, strip.widthPx - windowPx)))
}
