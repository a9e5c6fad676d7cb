import { marksAt } from '@/shared/notation/bar-content'
import { figuresOf, MOTION_HALF_STAFF_SPACES, type MeasuredBar } from '@/shared/notation/bar-measure'
import {
  barlinePx,
  crispPx,
  moveMark,
  rectangleMark,
  ruleMark,
  strokeMark,
  textMark,
  type Ink,
  type Mark,
  type Point,
} from '@/shared/notation/mark'
import { ellipsise, measureTextPx, textHeightPx } from '@/shared/notation/measure-text'
import type { BarMotion } from '@/shared/notation/score-input'
import type { BarFrame, Voice } from '@/shared/notation/score-layout'
import { figurePxOf, letteringOf } from '@/shared/notation/sizes'
import { frozenLinesPx, HOOK_STAFF_SPACES, type SystemRows } from '@/shared/notation/system-heights'
import { tieBetween, tieMark, type TieEnd } from '@/shared/notation/ties'

/** A bar in its system: where it is, and how its neighbours stand. */
export type PlacedBar = Readonly<{
  measured: MeasuredBar
  widthPx: number
  axisPx: number
  moments: BarFrame['moments']
  isFirstInSystem: boolean
  /** Whether the released bracket runs on from the bar before and into the bar after, on this system or the next. */
  isReleasedBefore: boolean
  isReleasedAfter: boolean
  /** Where the first note of the next bar on this system stands, from this bar's left edge; null at the system's end. */
  tieToPx: number | null
  /** The end of the next bar's first head that a tie comes to. */
  tieToEnd: TieEnd | null
  isMini: boolean
}>

const momentPx = ({ moments, axisPx }: PlacedBar, tick: number): number =>
  moments.find((moment) => moment.tick === tick)?.xPx ?? axisPx

/** Each voice's stroke through the mark, upper then lower: from and to, in halves of the mark's width, y downwards. */
const MOTION_STROKES: Readonly<Record<BarMotion, readonly (readonly [Point, Point])[]>> = {
  contrary: [
    [
      [-1, -0.15],
      [1, -0.75],
    ],
    [
      [-1, 0.15],
      [1, 0.75],
    ],
  ],
  oblique: [
    [
      [-1, -0.4],
      [1, -0.4],
    ],
    [
      [-1, 0.75],
      [1, 0.15],
    ],
  ],
  similar: [
    [
      [-1, -0.35],
      [1, -0.7],
    ],
    [
      [-1, 0.75],
      [1, 0.05],
    ],
  ],
  parallel: [
    [
      [-1, -0.1],
      [1, -0.7],
    ],
    [
      [-1, 0.65],
      [1, 0.05],
    ],
  ],
}

function motionMarks(
  motion: BarMotion,
  x: number,
  y: number,
  spacePx: number,
  group: string,
): readonly Mark[] {
  const half = MOTION_HALF_STAFF_SPACES * spacePx
  const strokePx = Math.max(1.4, 0.13 * spacePx)
  const reach = half - strokePx / 2
  return MOTION_STROKES[motion].map((stroke) =>
    strokeMark(
      { role: 'motion', ink: 'quiet', group },
      stroke.map(([dx, dy]): Point => [x + dx * reach, y + dy * reach]),
      strokePx,
    ),
  )
}

/** The bar line at the left edge, open where a motion mark stands across it. */
function leftBarlineMarks(
  placed: PlacedBar,
  rows: SystemRows,
  spacePx: number,
  isCrossed: boolean,
): readonly Mark[] {
  if (placed.isFirstInSystem) return []
  const name = { role: 'barline', ink: 'barline', group: `barline ${placed.measured.bar.number}` } as const
  const thickness = barlinePx(spacePx)
  const top = rows.staves[0]?.topPx ?? 0
  const bottom = (rows.staves.at(-1)?.topPx ?? 0) + 4 * spacePx
  if (!isCrossed || rows.railPx === null) return [ruleMark(name, [0, top], [0, bottom], thickness)]
  const open = (MOTION_HALF_STAFF_SPACES + 0.3) * spacePx
  return [
    ruleMark(name, [0, top], [0, Math.round(rows.railPx - open)], thickness),
    ruleMark(name, [0, Math.round(rows.railPx + open)], [0, bottom], thickness),
  ]
}

function hatchMarks(placed: PlacedBar, rows: SystemRows, spacePx: number): readonly Mark[] {
  const top = rows.staves[0]?.topPx ?? 0
  const bottom = (rows.staves.at(-1)?.topPx ?? 0) + 4 * spacePx
  const inset = 0.3 * spacePx
  const rise = 0.9 * spacePx
  const name = { role: 'hatch', ink: 'hatch', group: `hatch ${placed.measured.bar.number}` } as const
  const marks: Mark[] = []
  for (let y = top + rise; y <= bottom + 0.01; y += rise)
    marks.push(
      strokeMark(
        name,
        [
          [inset, y],
          [placed.widthPx - inset, y - rise],
        ],
        Math.max(1, 0.08 * spacePx),
      ),
    )
  return marks
}

/** The line over a bar: an open bracket over released bars in a row, two thin lines over a frozen one. */
function headLineMarks(placed: PlacedBar, rows: SystemRows, spacePx: number): readonly Mark[] {
  const { bar } = placed.measured
  const y = rows.headLinePx
  const inset = 0.35 * spacePx
  const group = `head ${bar.number}`
  if (bar.state === 'frozen') {
    const thickness = crispPx(0.09, spacePx)
    const name = { role: 'head-line', ink: 'quiet', group } as const
    return [0, frozenLinesPx(spacePx)].map((dy) =>
      ruleMark(name, [inset, y + dy], [placed.widthPx - inset, y + dy], thickness),
    )
  }
  if (bar.state !== 'released') return []
  const name = { role: 'head-line', ink: 'released', group } as const
  const thickness = Math.max(2, Math.round(0.19 * spacePx))
  const left = placed.isReleasedBefore ? 0 : inset
  const right = placed.isReleasedAfter ? placed.widthPx : placed.widthPx - inset
  const top = y - Math.floor(thickness / 2)
  const hook = (x: number): Mark =>
    rectangleMark(name, {
      left: x,
      right: x + thickness,
      top,
      bottom: top + Math.round(HOOK_STAFF_SPACES * spacePx),
    })
  return [
    rectangleMark(name, { left, right, top, bottom: top + thickness }),
    ...(placed.isReleasedBefore ? [] : [hook(left)]),
    ...(placed.isReleasedAfter ? [] : [hook(right - thickness)]),
  ]
}

function numberMark(placed: PlacedBar, rows: SystemRows, spacePx: number): Mark {
  const { bar, isFolded } = placed.measured
  const ink: Ink = bar.state === 'released' && !isFolded ? 'released' : 'quiet'
  const name = { role: 'number', ink, group: `number ${bar.number}` } as const
  const sizePx = letteringOf(spacePx).numberPx
  const text = String(bar.number)
  return isFolded
    ? textMark(name, text, placed.widthPx / 2, rows.numberBaselinePx, {
        face: 'Alegreya',
        sizePx,
        anchor: 'middle',
      })
    : textMark(name, text, 0.5 * spacePx, rows.numberBaselinePx, {
        face: 'Alegreya',
        sizePx,
        anchor: 'start',
      })
}

function railMarks(placed: PlacedBar, rows: SystemRows, spacePx: number): readonly Mark[] {
  const { bar, isMotionInside } = placed.measured
  if (rows.railPx === null) return []
  const marks: Mark[] = []
  for (const { tick, text, tone, isWeak } of figuresOf(bar)) {
    const sizePx = figurePxOf(spacePx, isWeak)
    const baseline = rows.railPx + textHeightPx('8', 'Alegreya', sizePx).above / 2
    const look = { face: 'Alegreya', sizePx, anchor: 'middle' } as const
    const name = { role: 'figure', ink: tone, group: `figure ${bar.number} ${tick}` } as const
    marks.push(textMark(name, text, momentPx(placed, tick), baseline, look))
  }
  if (bar.motion) {
    const x = isMotionInside ? (MOTION_HALF_STAFF_SPACES + 0.3) * spacePx : 0
    marks.push(...motionMarks(bar.motion, x, rows.railPx, spacePx, `motion ${bar.number}`))
  }
  return marks
}

function labelMarks(placed: PlacedBar, rows: SystemRows, spacePx: number): readonly Mark[] {
  const { bar, endPx } = placed.measured
  if (bar.label === null) return []
  const face = 'AlegreyaSans'
  const sizePx = letteringOf(spacePx).labelPx
  const padding = 0.3 * spacePx
  const text = ellipsise(bar.label, face, sizePx, placed.widthPx - endPx - 2 * padding)
  if (text === '') return []
  const half = measureTextPx(text, face, sizePx) / 2
  const x = Math.min(Math.max(placed.axisPx, padding + half), placed.widthPx - endPx - padding - half)
  const name = { role: 'label', ink: 'quiet', group: `label ${bar.number}` } as const
  return [textMark(name, text, x, rows.labelBaselinePx, { face, sizePx, anchor: 'middle' })]
}

function contentMarks(placed: PlacedBar, voice: Voice, spacePx: number): readonly Mark[] {
  const content = placed.measured.content[voice]
  const xs = content.columns.map(({ tick }) => momentPx(placed, tick))
  return [...marksAt(content, xs, spacePx), ...tieMarksOver(placed, voice, spacePx)]
}

/** The tie over the bar line to the next bar, or to the end of the system; and what of one comes from the system before. */
function tieMarksOver(placed: PlacedBar, voice: Voice, spacePx: number): readonly Mark[] {
  const { bar, content } = placed.measured
  const { columns, tieOver, tieInto } = content[voice]
  const marks: Mark[] = []
  const last = columns.at(-1)
  if (tieOver && last) {
    const to = placed.tieToPx ?? placed.widthPx
    marks.push(
      tieMark(
        tieBetween(tieOver, placed.tieToEnd),
        momentPx(placed, last.tick),
        to,
        spacePx,
        `${bar.number} tie over`,
      ),
    )
  }
  if (tieInto && placed.isFirstInSystem) {
    const to = momentPx(placed, columns[0]?.tick ?? 0)
    const from = Math.min(0.3 * spacePx, to - 1.2 * spacePx)
    marks.push(tieMark(tieInto, from, to, spacePx, `${bar.number} tie into`))
  }
  return marks
}

/** Everything that belongs to one bar, from its own left edge. */
export function barMarks(placed: PlacedBar, rows: SystemRows, spacePx: number): readonly Mark[] {
  const { measured, isMini } = placed
  const notes = rows.staves.flatMap(({ voice, topPx }) =>
    contentMarks(placed, voice, spacePx).map((mark) => moveMark(mark, 0, topPx)),
  )
  if (isMini) return [...leftBarlineMarks(placed, rows, spacePx, false), ...notes]
  const heads = numberMark(placed, rows, spacePx)
  if (measured.isFolded)
    return [...leftBarlineMarks(placed, rows, spacePx, false), ...hatchMarks(placed, rows, spacePx), heads]
  const isCrossed = measured.bar.motion !== null && !measured.isMotionInside
  return [
    ...leftBarlineMarks(placed, rows, spacePx, isCrossed),
    heads,
    ...headLineMarks(placed, rows, spacePx),
    ...notes,
    ...railMarks(placed, rows, spacePx),
    ...labelMarks(placed, rows, spacePx),
  ]
}
