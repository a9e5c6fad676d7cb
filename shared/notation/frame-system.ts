import { breakSystems, stretchBars } from '@/shared/notation/bar-widths'
import type { MeasuredBar } from '@/shared/notation/bar-measure'
import type { BarFrame } from '@/shared/notation/score-layout'
import { naturalPx, type Setting } from '@/shared/notation/setting'
import { SIZE_FACTS } from '@/shared/notation/sizes'

/** Index of each system's first bar. A strip and a mini never break. */
export function systemStarts({ options, measured, prefixPx, metrePx, spacePx }: Setting): readonly number[] {
  if (measured.length === 0 || options.size === 'strip' || options.size === 'mini') return [0]
  return breakSystems(
    measured.map((bar, i) => naturalPx(bar, spacePx) + (i === 0 ? metrePx : 0)),
    options.widthPx - prefixPx,
  )
}

function barWidths(
  { options, spacePx }: Setting,
  bars: readonly MeasuredBar[],
  prefixPx: number,
  isOnly: boolean,
): readonly number[] {
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

/** Where notes are all whole, the axis stands in the middle of what a bar has for its notes, or as near to it as those on either side let it. */
const axisIn = ({ leftPx, rightPx, hangingPx, endPx }: MeasuredBar, widthPx: number): number =>
  Math.min(Math.max((widthPx + hangingPx - endPx) / 2, leftPx), widthPx - rightPx)

/** Room before the first notes, as a share of what a whole note asks for. */
const LEAD_SHARE = 0.3

/** The moments of a bar as wide as this, from its left edge: what is to spare goes to each by how long it lasts. */
function momentsIn(bar: MeasuredBar, widthPx: number): BarFrame['moments'] {
  const { ticks, leastXs, shares } = bar.moments
  if (!bar.isMeasured) {
    const axisPx = axisIn(bar, widthPx)
    return ticks.map((tick, i) => ({ tick, xPx: axisPx + (leastXs[i] as number) }))
  }
  const whole = shares.reduce((sum, share) => sum + share, LEAD_SHARE)
  const unitPx = Math.max(0, widthPx - bar.leftPx - bar.rightPx) / whole
  let before = LEAD_SHARE
  return ticks.map((tick, i) => {
    const xPx = bar.leftPx + (leastXs[i] as number) + before * unitPx
    before += shares[i] as number
    return { tick, xPx }
  })
}

/** A system with its bars spaced, before any mark is made. */
export type SystemFrame = Readonly<{
  from: number
  to: number
  prefixPx: number
  widthPx: number
  bars: readonly BarFrame[]
}>

export function frameSystem(setting: Setting, from: number, to: number): SystemFrame {
  const { measured } = setting
  const prefixPx = setting.prefixPx + (from === 0 ? setting.metrePx : 0)
  const bars = measured.slice(from, to)
  const widths = barWidths(setting, bars, prefixPx, from === 0 && to === measured.length)
  // Bar lines stand on whole px. No bar loses by it, as the least widths are whole.
  let edge = prefixPx
  let xPx = prefixPx
  const frames = bars.map((measuredBar, i): BarFrame => {
    edge += widths[i] as number
    const widthPx = Math.round(edge) - xPx
    const { bar, isFolded } = measuredBar
    const moments = momentsIn(measuredBar, widthPx)
    const place = { xPx, widthPx, axisPx: moments[0]?.xPx ?? axisIn(measuredBar, widthPx), moments }
    xPx += widthPx
    return { index: from + i, number: bar.number, isFolded, ...place }
  })
  return { from, to, prefixPx, widthPx: xPx, bars: frames }
}
