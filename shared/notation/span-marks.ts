import {
  archMark,
  crispPx,
  lozengeMark,
  rectangleMark,
  textMark,
  type Mark,
  type Point,
} from '@/shared/notation/mark'
import { ellipsise, measureTextPx } from '@/shared/notation/measure-text'
import type { ScoreArc, ScoreBracket } from '@/shared/notation/score-input'
import type { BarFrame } from '@/shared/notation/score-layout'
import { letteringOf } from '@/shared/notation/sizes'
import {
  ARC_LEVEL_STAFF_SPACES,
  BRACKET_HOOK_STAFF_SPACES,
  type SystemRows,
} from '@/shared/notation/system-heights'

/** The part of a span that falls on a system, and whether it runs on past either end of it. */
type Segment = Readonly<{ first: BarFrame; last: BarFrame; isOpenLeft: boolean; isOpenRight: boolean }>

export function segmentOn(
  bars: readonly BarFrame[],
  span: { fromBar: number; toBar: number },
): Segment | null {
  const within = bars.filter(({ number }) => number >= span.fromBar && number <= span.toBar)
  const [first, last] = [within[0], within.at(-1)]
  if (!first || !last) return null
  return {
    first,
    last,
    isOpenLeft: first.number > span.fromBar,
    isOpenRight: last.number < span.toBar,
  }
}

/** Words of a bracket keep this far from the edge of a strip's window, in staff spaces. */
const LABEL_INSET = 1

const axisOf = (bar: BarFrame): number => bar.xPx + bar.axisPx

/** A finding over the staff: an arch from bar to bar (dashed for a remark), or a lozenge over its only bar. */
export function findingMarks(
  arc: ScoreArc,
  level: number,
  bars: readonly BarFrame[],
  rows: SystemRows,
  spacePx: number,
): readonly Mark[] {
  const segment = segmentOn(bars, arc)
  if (!segment) return []
  const { first, last, isOpenLeft, isOpenRight } = segment
  const foot = rows.arcFootPx - level * ARC_LEVEL_STAFF_SPACES * spacePx
  const strokePx = Math.max(1.5, 0.14 * spacePx)
  const group = `finding ${arc.id}`
  if (arc.fromBar === arc.toBar) {
    const look = { isFilled: arc.tone === 'breach', strokePx }
    const y = foot - 0.55 * spacePx
    return [lozengeMark({ role: 'finding', ink: arc.tone, group }, axisOf(first), y, 0.42 * spacePx, look)]
  }
  const inset = 0.4 * spacePx
  const from: Point = [isOpenLeft ? first.xPx + strokePx : axisOf(first) + inset, foot - strokePx / 2]
  const to: Point = [
    isOpenRight ? last.xPx + last.widthPx - strokePx : axisOf(last) - inset,
    foot - strokePx / 2,
  ]
  if (to[0] - from[0] < inset) return []
  const height = Math.min(0.95 * spacePx, 0.35 * (to[0] - from[0]))
  return [
    archMark({ role: 'arc', ink: arc.tone, group }, from, to, height, {
      strokePx,
      isDashed: arc.tone === 'remark',
    }),
  ]
}

/** The stretch of a system that is in view, from its left edge. */
export type ShownPart = Readonly<{ leftPx: number; rightPx: number }>

type BracketPlace = Readonly<{ index: number; level: number; isLabelHere: boolean; shown: ShownPart }>

/** A gesture under the staff: a bracket, open where it runs on, its words shortened to what it spans and what shows. */
export function bracketMarks(
  bracket: ScoreBracket,
  place: BracketPlace,
  bars: readonly BarFrame[],
  rows: SystemRows,
  spacePx: number,
): readonly Mark[] {
  const { index, level, isLabelHere, shown } = place
  const segment = segmentOn(bars, bracket)
  const row = rows.brackets[level]
  if (!segment || !row) return []
  const { first, last, isOpenLeft, isOpenRight } = segment
  const group = `bracket ${index}`
  const name = { role: 'bracket', ink: 'quiet', group } as const
  const thickness = crispPx(0.12, spacePx)
  const left = first.xPx + (isOpenLeft ? 0 : 0.35 * spacePx)
  const right = last.xPx + last.widthPx - (isOpenRight ? 0 : 0.35 * spacePx)
  const top = row.linePx - Math.round(BRACKET_HOOK_STAFF_SPACES * spacePx)
  const bottom = row.linePx + thickness
  const marks: Mark[] = [rectangleMark(name, { left, right, top: row.linePx, bottom })]
  if (!isOpenLeft) marks.push(rectangleMark(name, { left, right: left + thickness, top, bottom }))
  if (!isOpenRight) marks.push(rectangleMark(name, { left: right - thickness, right, top, bottom }))
  const face = 'AlegreyaItalic'
  const sizePx = letteringOf(spacePx).bracketPx
  const isShown = right > shown.leftPx && left < shown.rightPx
  const from = isShown ? Math.max(left, shown.leftPx + LABEL_INSET * spacePx) : left
  const to = isShown ? Math.min(right, shown.rightPx - LABEL_INSET * spacePx) : right
  // Words that fit whole are said again on every system; shortened ones only where there is most room.
  const whole = measureTextPx(bracket.label, face, sizePx) <= to - from ? bracket.label : ''
  const text = isLabelHere ? ellipsise(bracket.label, face, sizePx, to - from) : whole
  const label = { role: 'bracket-label', ink: 'quiet', group } as const
  if (text !== '')
    marks.push(textMark(label, text, (from + to) / 2, row.baselinePx, { face, sizePx, anchor: 'middle' }))
  return marks
}
