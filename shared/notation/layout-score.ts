import { frameSystem, systemStarts } from '@/shared/notation/frame-system'
import { arrangeSpans, layoutSystem } from '@/shared/notation/layout-system'
import type { ScoreInput } from '@/shared/notation/score-input'
import type { ScoreLayout, ScoreLayoutOptions, SystemLayout } from '@/shared/notation/score-layout'
import { naturalPx, settingAt, type Setting } from '@/shared/notation/setting'
import { SIZE_FACTS } from '@/shared/notation/sizes'

const SYSTEM_GAP_STAFF_SPACES = 2.2
/** No staff is set smaller than this, whatever has to fit. */
const SMALLEST_SPACE_PX = 4

function layoutAt(setting: Setting): ScoreLayout {
  const { input, options, spacePx, measured } = setting
  const starts = systemStarts(setting)
  const frames = starts.map((from, i) => frameSystem(setting, from, starts[i + 1] ?? measured.length))
  const spans = arrangeSpans(setting, frames)
  const systems: SystemLayout[] = []
  let yPx = 0
  frames.forEach((frame, i) => {
    const system = layoutSystem(setting, frame, i, yPx, spans)
    systems.push(system)
    yPx += system.heightPx + Math.round(SYSTEM_GAP_STAFF_SPACES * spacePx)
  })
  const last = systems.at(-1)
  return {
    size: options.size,
    widthPx: Math.max(options.widthPx, ...systems.map((system) => system.widthPx)),
    heightPx: last ? last.yPx + last.heightPx : 0,
    spacePx,
    signature: input.signature,
    pressedVoice: input.clefs.line === null ? 'cantus' : 'line',
    systems,
  }
}

const fitsWidth = ({ measured, options, prefixPx, metrePx }: Setting): boolean =>
  options.size === 'mini'
    ? measured.reduce((sum, bar) => sum + bar.leastPx, prefixPx + metrePx) <= options.widthPx
    : measured.every((bar, i) => prefixPx + (i === 0 ? metrePx : 0) + bar.leastPx <= options.widthPx)

/** Bars keep at least a tenth of spare width. */
const isRoomy = ({ measured, options, prefixPx, metrePx, spacePx }: Setting): boolean =>
  prefixPx + metrePx + measured.reduce((sum, bar) => sum + naturalPx(bar, spacePx), 0) <=
  0.9 * options.widthPx

/** The largest whole number from `least` to `most` that passes, or null; whatever is smaller than one that passes does too. */
function largestPassing(least: number, most: number, isPassing: (value: number) => boolean): number | null {
  if (most < least) return null
  if (isPassing(most)) return most
  if (!isPassing(least)) return null
  let [passing, failing] = [least, most]
  while (failing - passing > 1) {
    const middle = Math.floor((passing + failing) / 2)
    if (isPassing(middle)) passing = middle
    else failing = middle
  }
  return passing
}

/** On a wall one system is worth a staff this much smaller than the width suggests; past that, several are better. */
const LEAST_SHARE_FOR_ONE_SYSTEM = 0.6
const SHARE_FOR_SEVERAL_SYSTEMS = 0.72

/**
 * Engraves a score: every glyph, line and word of it with its place, in px. The staff space is the largest at which the
 * music fits: on the wall on one system where that keeps it legible from the back row, elsewhere on as many as it needs.
 */
export function layoutScore(input: ScoreInput, options: ScoreLayoutOptions): ScoreLayout {
  const { spaceFor, leastSpacePx, mostGrowth } = SIZE_FACTS[options.size]
  const preferred = spaceFor(options.widthPx)
  const { maxHeightPx } = options
  const settings = new Map<number, Setting>()
  const settingOf = (spacePx: number): Setting => {
    const setting = settings.get(spacePx) ?? settingAt(input, options, spacePx)
    settings.set(spacePx, setting)
    return setting
  }
  const fits = (spacePx: number): boolean =>
    fitsWidth(settingOf(spacePx)) &&
    (maxHeightPx === undefined || layoutAt(settingOf(spacePx)).heightPx <= maxHeightPx)

  if (options.size === 'wall') {
    const least = Math.max(leastSpacePx, Math.ceil(LEAST_SHARE_FOR_ONE_SYSTEM * preferred))
    const most = maxHeightPx === undefined ? preferred : Math.round(mostGrowth * preferred)
    const isComfortable = (spacePx: number): boolean =>
      systemStarts(settingOf(spacePx)).length === 1 && (spacePx <= preferred || isRoomy(settingOf(spacePx)))
    const space = largestPassing(least, most, (spacePx) => isComfortable(spacePx) && fits(spacePx))
    if (space !== null) return layoutAt(settingOf(space))
  }
  const most =
    options.size === 'wall'
      ? Math.max(leastSpacePx, Math.round(SHARE_FOR_SEVERAL_SYSTEMS * preferred))
      : preferred
  const space = largestPassing(leastSpacePx, most, fits)
  if (space !== null) return layoutAt(settingOf(space))
  // Too high at any size: the width alone decides, and the page scrolls.
  let smallest = leastSpacePx
  while (smallest > SMALLEST_SPACE_PX && !fitsWidth(settingOf(smallest))) smallest--
  return layoutAt(settingOf(smallest))
}
