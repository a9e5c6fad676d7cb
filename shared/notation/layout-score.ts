import { barMarks } from '@/shared/notation/bar-marks'
import { measureBars, type MeasuredBar } from '@/shared/notation/bar-measure'
import { breakSystems, stretchBars } from '@/shared/notation/bar-widths'
import { uniteBoxes, type Box } from '@/shared/notation/box'
import { assignLevels } from '@/shared/notation/levels'
import type { Mark } from '@/shared/notation/mark'
import type { ScoreInput } from '@/shared/notation/score-input'
import type {
  BarFrame,
  BarLayout,
  ScoreLayout,
  ScoreLayoutOptions,
  SystemLayout,
  Voice,
} from '@/shared/notation/score-layout'
import { SIZE_FACTS } from '@/shared/notation/sizes'
import { bracketMarks, findingMarks, segmentOn, type ShownPart } from '@/shared/notation/span-marks'
import { stripOffsetPx } from '@/shared/notation/strip-offset'
import { endBarlineMarks, prefixMarks, prefixWidthPx, staffLineMarks } from '@/shared/notation/system-marks'
import { arrangeRows, type SystemRows } from '@/shared/notation/system-heights'
import type { Clef } from '@/shared/theory/clef'

const SYSTEM_GAP_STAFF_SPACES = 2.2
/** No staff is set smaller than this, whatever has to fit. */
const SMALLEST_SPACE_PX = 4

type Staff = Readonly<{ voice: Voice; clef: Clef }>

function stavesOf({ position, clefs }: ScoreInput, isMini: boolean): readonly Staff[] {
  const cantus: Staff = { voice: 'cantus', clef: clefs.cantus }
  if (clefs.line === null) return [cantus]
  const line: Staff = { voice: 'line', clef: clefs.line }
  if (isMini) return [line]
  return position === 'above' ? [line, cantus] : [cantus, line]
}

/** Everything about a layout that is settled before the first mark is placed. */
type Setting = Readonly<{
  input: ScoreInput
  options: ScoreLayoutOptions
  spacePx: number
  staves: readonly Staff[]
  prefixPx: number
  measured: readonly MeasuredBar[]
}>

/** A few bars of a proposal are read beside their score; a cantus by itself needs its clef. */
const hasClefs = ({ clefs }: ScoreInput, { size }: ScoreLayoutOptions): boolean =>
  size !== 'mini' || clefs.line === null

function settingAt(input: ScoreInput, options: ScoreLayoutOptions, spacePx: number): Setting {
  const isMini = options.size === 'mini'
  const staves = stavesOf(input, isMini)
  const clefs = staves.map(({ clef }) => clef)
  const prefixPx = hasClefs(input, options) ? prefixWidthPx(clefs, input.signature, spacePx) : 0
  return { input, options, spacePx, staves, prefixPx, measured: measureBars(input, options, spacePx) }
}

const naturalPx = (bar: MeasuredBar, spacePx: number): number =>
  Math.max(bar.leastPx, bar.extraPx + bar.weight * spacePx)

/** Index of each system's first bar. A strip and a mini never break. */
function systemStarts({ options, measured, prefixPx, spacePx }: Setting): readonly number[] {
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

const unite = (boxes: readonly (Box | null)[]): Box | null => {
  const present = boxes.filter((box) => box !== null)
  return present.length === 0 ? null : uniteBoxes(present)
}

const isReleased = (bar: MeasuredBar | undefined): boolean =>
  bar !== undefined && bar.bar.state === 'released' && !bar.isFolded

/** A system with its bars spaced, before any mark is made. */
type Frame = Readonly<{
  from: number
  to: number
  prefixPx: number
  widthPx: number
  bars: readonly BarFrame[]
}>

function frameSystem(setting: Setting, from: number, to: number): Frame {
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

/** What spans bars, for the whole score: the level of each, and the system on which a bracket has its words. */
type Spans = Readonly<{
  arcs: readonly number[]
  brackets: readonly number[]
  labelSystems: readonly number[]
}>

function arrangeSpans({ input }: Setting, frames: readonly Frame[]): Spans {
  const widthOn = (frame: Frame, span: { fromBar: number; toBar: number }): number => {
    const segment = segmentOn(frame.bars, span)
    return segment ? segment.last.xPx + segment.last.widthPx - segment.first.xPx : 0
  }
  return {
    // An arch ends beside the axis of its last bar, so the next may begin there; a lozenge fills its bar.
    arcs: assignLevels(input.arcs, (a, b) => a.fromBar < a.toBar && b.fromBar < b.toBar),
    brackets: assignLevels(input.brackets, () => false),
    labelSystems: input.brackets.map((bracket) => {
      const widths = frames.map((frame) => widthOn(frame, bracket))
      return widths.indexOf(Math.max(...widths))
    }),
  }
}

/** What of a system is in view: all of it, or the window of a strip around the bar in hand. */
function shownPart({ options, prefixPx }: Setting, frame: Frame): ShownPart {
  if (options.size !== 'strip') return { leftPx: 0, rightPx: frame.widthPx }
  const offsetPx = stripOffsetPx(frame, options.handBar ?? null, options.widthPx)
  return { leftPx: offsetPx + prefixPx, rightPx: offsetPx + options.widthPx }
}

function layoutSystem(
  setting: Setting,
  frame: Frame,
  index: number,
  yPx: number,
  spanning: Spans,
): SystemLayout {
  const { input, options, spacePx, prefixPx, measured } = setting
  const isMini = options.size === 'mini'
  const { from, to, widthPx, bars: frames } = frame
  const shown = shownPart(setting, frame)
  const bars = measured.slice(from, to)

  const arcsHere = input.arcs.map((arc) => (isMini ? null : segmentOn(frames, arc)))
  const bracketsHere = input.brackets.map((bracket) => (isMini ? null : segmentOn(frames, bracket)))
  const highest = (all: readonly number[], here: readonly unknown[]): number =>
    all.reduce((most, level, i) => (here[i] ? Math.max(most, level + 1) : most), 0)
  const rows: SystemRows = arrangeRows({
    size: options.size,
    spacePx,
    staves: setting.staves.map(({ voice, clef }) => ({
      voice,
      clef,
      box: unite(bars.map((bar) => bar.content[voice].box)),
    })),
    signature: hasClefs(input, options) ? input.signature : null,
    hasLabels: !isMini && input.bars.some((bar) => bar.label !== null),
    arcLevels: highest(spanning.arcs, arcsHere),
    bracketLevels: isMini ? 0 : Math.max(...spanning.brackets.map((level) => level + 1), 0),
  })

  const placedBars = frames.map((frame, i): BarLayout => {
    const placed = {
      measured: bars[i] as MeasuredBar,
      widthPx: frame.widthPx,
      axisPx: frame.axisPx,
      isFirstInSystem: i === 0,
      isReleasedBefore: isReleased(measured[frame.index - 1]),
      isReleasedAfter: isReleased(measured[frame.index + 1]),
      isMini,
    }
    return { ...frame, marks: barMarks(placed, rows, spacePx) }
  })

  const spans: Mark[] = [
    ...(isMini ? [] : endBarlineMarks(rows.staves, widthPx, spacePx, to === measured.length)),
    ...input.arcs.flatMap((arc, i) =>
      arcsHere[i] ? findingMarks(arc, spanning.arcs[i] as number, frames, rows, spacePx) : [],
    ),
    ...input.brackets.flatMap((bracket, i) =>
      bracketsHere[i]
        ? bracketMarks(
            bracket,
            {
              index: i,
              level: spanning.brackets[i] as number,
              isLabelHere: spanning.labelSystems[i] === index,
              shown,
            },
            frames,
            rows,
            spacePx,
          )
        : [],
    ),
  ]

  const top = rows.staves[0]?.topPx ?? 0
  const bottom = (rows.staves.at(-1)?.topPx ?? 0) + 4 * spacePx
  return {
    xPx: 0,
    yPx,
    widthPx,
    heightPx: rows.heightPx,
    prefixPx,
    staves: rows.staves,
    stavesBox: { left: 0, right: widthPx, top, bottom },
    railPx: rows.railPx,
    staffLines: staffLineMarks(rows.staves, widthPx, spacePx),
    prefix: hasClefs(input, options) ? prefixMarks(rows.staves, input.signature, spacePx) : [],
    spans,
    bars: placedBars,
  }
}

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

const fitsWidth = ({ measured, options, prefixPx }: Setting): boolean =>
  options.size === 'mini'
    ? measured.reduce((sum, bar) => sum + bar.leastPx, prefixPx) <= options.widthPx
    : measured.every((bar) => prefixPx + bar.leastPx <= options.widthPx)

/** Bars keep at least a tenth of spare width. */
const isRoomy = ({ measured, options, prefixPx, spacePx }: Setting): boolean =>
  prefixPx + measured.reduce((sum, bar) => sum + naturalPx(bar, spacePx), 0) <= 0.9 * options.widthPx

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
