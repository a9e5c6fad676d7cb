import { barMarks } from '@/shared/notation/bar-marks'
import type { MeasuredBar } from '@/shared/notation/bar-measure'
import type { SystemFrame } from '@/shared/notation/frame-system'
import { assignLevels } from '@/shared/notation/levels'
import type { Mark } from '@/shared/notation/mark'
import type { BarLayout, SystemLayout } from '@/shared/notation/score-layout'
import { hasClefs, type Setting } from '@/shared/notation/setting'
import { bracketMarks, findingMarks, segmentOn, type ShownPart } from '@/shared/notation/span-marks'
import { stripOffsetPx } from '@/shared/notation/strip-offset'
import { arrangeRows } from '@/shared/notation/system-heights'
import {
  endBarlineMarks,
  METRE_GAP,
  metreMarks,
  PREFIX_GAP,
  prefixMarks,
  staffLineMarks,
} from '@/shared/notation/system-marks'
import { stoppingShortPx } from '@/shared/notation/ties'

type Reach = Readonly<{ top: number; bottom: number }>

function reachOf(reaches: readonly (Reach | null)[]): Reach | null {
  const present = reaches.filter((reach) => reach !== null)
  if (present.length === 0) return null
  return {
    top: Math.min(...present.map(({ top }) => top)),
    bottom: Math.max(...present.map(({ bottom }) => bottom)),
  }
}

function tieShortPx(bar: MeasuredBar | undefined, next: MeasuredBar | undefined, spacePx: number): number {
  const over = bar?.content.line.tieOver
  return over ? stoppingShortPx(over, next?.content.line.tieInto ?? null, spacePx) : 0
}

const isReleased = (bar: MeasuredBar | undefined): boolean =>
  bar !== undefined && bar.bar.state === 'released' && !bar.isFolded

/** What spans bars, for the whole score: the level of each, and the system on which a bracket has its words. */
export type Spans = Readonly<{
  arcs: readonly number[]
  brackets: readonly number[]
  labelSystems: readonly number[]
}>

export function arrangeSpans({ input }: Setting, frames: readonly SystemFrame[]): Spans {
  const widthOn = (frame: SystemFrame, span: { fromBar: number; toBar: number }): number => {
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
function shownPart({ options }: Setting, frame: SystemFrame): ShownPart {
  if (options.size !== 'strip') return { leftPx: 0, rightPx: frame.widthPx }
  const offsetPx = stripOffsetPx(frame, options.handBar ?? null, options.widthPx)
  return { leftPx: offsetPx + frame.prefixPx, rightPx: offsetPx + options.widthPx }
}

/** Places everything of one system, its top at `yPx`. */
export function layoutSystem(
  setting: Setting,
  frame: SystemFrame,
  index: number,
  yPx: number,
  spanning: Spans,
): SystemLayout {
  const { input, options, spacePx, measured } = setting
  const isMini = options.size === 'mini'
  const { from, to, prefixPx, widthPx, bars: frames } = frame
  const shown = shownPart(setting, frame)
  const metrePx = from === 0 ? setting.metrePx : 0
  const bars = measured.slice(from, to)

  const arcsHere = input.arcs.map((arc) => (isMini ? null : segmentOn(frames, arc)))
  const bracketsHere = input.brackets.map((bracket) => (isMini ? null : segmentOn(frames, bracket)))
  const highest = (all: readonly number[], here: readonly unknown[]): number =>
    all.reduce((most, level, i) => (here[i] ? Math.max(most, level + 1) : most), 0)
  const rows = arrangeRows({
    size: options.size,
    spacePx,
    staves: setting.staves.map(({ voice, clef }) => ({
      voice,
      clef,
      reach: reachOf(bars.map((bar) => bar.content[voice].reach)),
    })),
    signature: hasClefs(input, options) ? input.signature : null,
    hasLabels: !isMini && input.bars.some((bar) => bar.label !== null),
    arcLevels: highest(spanning.arcs, arcsHere),
    bracketLevels: isMini ? 0 : Math.max(...spanning.brackets.map((level) => level + 1), 0),
  })

  const placedBars = frames.map((frame, i): BarLayout => {
    const next = frames[i + 1]
    const placed = {
      measured: bars[i] as MeasuredBar,
      widthPx: frame.widthPx,
      axisPx: frame.axisPx,
      moments: frame.moments,
      isFirstInSystem: i === 0,
      isReleasedBefore: isReleased(measured[frame.index - 1]),
      isReleasedAfter: isReleased(measured[frame.index + 1]),
      tieToPx: next ? next.xPx - frame.xPx + next.axisPx - tieShortPx(bars[i], bars[i + 1], spacePx) : null,
      tieToEnd: bars[i + 1]?.content.line.tieInto ?? null,
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
    prefix: [
      ...(hasClefs(input, options) ? prefixMarks(rows.staves, input.signature, spacePx) : []),
      ...(metrePx > 0
        ? metreMarks(rows.staves, prefixPx - metrePx - PREFIX_GAP * spacePx + METRE_GAP * spacePx, spacePx)
        : []),
    ],
    spans,
    bars: placedBars,
  }
}
