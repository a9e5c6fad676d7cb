import { breakSystems, stretchBars } from '@/shared/notation/bar-widths'
import type { MeasuredBar } from '@/shared/notation/bar-measure'
import type { BarFrame } from '@/shared/notation/score-layout'
import { naturalPx, type Setting } from '@/shared/notation/setting'
import { SIZE_FACTS } from '@/shared/notation/sizes'

/** Index of each system's first bar. A strip and a mini never break. */
export function systemStarts({ options, measured, prefixPx, spacePx }: Setting): readonly number[] {
  if (measured.length === 0 || options.size === 'strip' || options.size === 'mini') return [0]
  return breakSystems(
    measured.map((bar) => naturalPx(bar, spacePx)),
    options.widthPx - prefixPx,
  )
}

function barWidths(setting: Setting, bars: readonly MeasuredBar[], isOnly: boolean): readonly number[] {
  const { options, spacePx, prefixPx } = setting
  const { maxStretch } = SIZE_FACTS[options.size]
  const availablePx = options.widthPx - prefixPx
  const natural = bars.reduce((sum, bar) => sum + naturalPx(bar, spacePx), 0)
  const most = maxStretch === null || !isOnly ? Infinity : natural * maxStretch
  const wanted = options.size === 'strip' ? Math.max(availablePx, natural) : availablePx
  const elastic = bars.map((bar) =>
    options.size === 'strip' ? { ...bar, leastPx: naturalPx(bar, spacePx) } : bar,
  )
  return stretchBars(elastic, Math.min(most, wanted))
}

/** The axis stands in the middle of what a bar has for its notes, or as near to it as those on either side let it. */
const axisIn = ({ leftPx, rightPx, hangingPx, endPx }: MeasuredBar, widthPx: number): number =>
  Math.min(Math.max((widthPx + hangingPx - endPx) / 2, leftPx), widthPx - rightPx)

/** A system with its bars spaced, before any mark is made. */
export type SystemFrame = Readonly<{
  from: number
  to: number
  prefixPx: number
  widthPx: number
  bars: readonly BarFrame[]
}>

export function frameSystem(setting: Setting, from: number, to: number): SystemFrame {
  const { prefixPx, measured } = setting
  const bars = measured.slice(from, to)
  const widths = barWidths(setting, bars, from === 0 && to === measured.length)
  // Bar lines stand on whole px. No bar loses by it, as the least widths are whole.
  let edge = prefixPx
  let xPx = prefixPx
  const frames = bars.map((measuredBar, i): BarFrame => {
    edge += widths[i] as number
    const widthPx = Math.round(edge) - xPx
    const { bar, isFolded } = measuredBar
    const place = { xPx, widthPx, axisPx: axisIn(measuredBar, widthPx) }
    xPx += widthPx
    return { index: from + i, number: bar.number, isFolded, ...place }
  })
  return { from, to, prefixPx, widthPx: xPx, bars: frames }
}
