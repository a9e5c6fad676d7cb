import { BRAVURA, ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import { moveBox, type Box } from '@/shared/notation/box'
import type { GlyphName } from '@/shared/notation/glyphs'
import { measureTextPx, textHeightPx } from '@/shared/notation/measure-text'
import type { Tone } from '@/shared/notation/score-input'
import type { FaceName } from '@/shared/notation/text-widths'

/** What a mark is drawn in, by meaning: the tones of the input, and what belongs to the page. */
export type Ink = Tone | 'staff' | 'barline' | 'released' | 'hatch'

/** What a mark is. Marks of one `group` belong together and may touch: a note and its ledger lines. */
export type MarkRole =
  | 'staff-line'
  | 'barline'
  | 'clef'
  | 'signature'
  | 'ledger'
  | 'notehead'
  | 'stem'
  | 'flag'
  | 'beam'
  | 'dot'
  | 'rest'
  | 'tie'
  | 'metre'
  | 'accidental'
  | 'lozenge'
  | 'count'
  | 'label'
  | 'figure'
  | 'motion'
  | 'number'
  | 'head-line'
  | 'hatch'
  | 'arc'
  | 'finding'
  | 'bracket'
  | 'bracket-label'

export type Point = readonly [x: number, y: number]

type Shape =
  /** A music glyph with its origin at (x, y); `spacePx` is the staff space it is set at. */
  | Readonly<{ kind: 'glyph'; glyph: GlyphName; x: number; y: number; spacePx: number }>
  | Readonly<{ kind: 'rectangle' }>
  /** A closed shape: filled with its ink, or hollow with the ground inside. */
  | Readonly<{ kind: 'polygon'; points: readonly Point[]; isFilled: boolean; strokePx: number }>
  | Readonly<{ kind: 'stroke'; points: readonly Point[]; strokePx: number }>
  /** A quadratic curve. */
  | Readonly<{ kind: 'curve'; from: Point; control: Point; to: Point; strokePx: number; isDashed: boolean }>
  /** A tie: thin at its ends, thick at its crown; the two controls are those of its outer and its inner edge. */
  | Readonly<{ kind: 'crescent'; from: Point; outer: Point; inner: Point; to: Point }>
  /** Words or figures: `x` is where the text starts and `y` its baseline. */
  | Readonly<{ kind: 'text'; text: string; face: FaceName; sizePx: number; x: number; y: number }>

export type Mark = Shape & Readonly<{ role: MarkRole; ink: Ink; group: string; box: Box }>

export type MarkName = Readonly<{ role: MarkRole; ink: Ink; group: string }>

export function glyphMark(name: MarkName, glyph: GlyphName, x: number, y: number, spacePx: number): Mark {
  const { left, right, top, bottom } = BRAVURA[glyph]
  const box = {
    left: x + left * spacePx,
    right: x + right * spacePx,
    top: y - top * spacePx,
    bottom: y - bottom * spacePx,
  }
  return { ...name, kind: 'glyph', glyph, x, y, spacePx, box }
}

export const rectangleMark = (name: MarkName, box: Box): Mark => ({ ...name, kind: 'rectangle', box })

const boxAround = (points: readonly Point[], by: number): Box => ({
  left: Math.min(...points.map(([x]) => x)) - by,
  right: Math.max(...points.map(([x]) => x)) + by,
  top: Math.min(...points.map(([, y]) => y)) - by,
  bottom: Math.max(...points.map(([, y]) => y)) + by,
})

export const strokeMark = (name: MarkName, points: readonly Point[], strokePx: number): Mark => ({
  ...name,
  kind: 'stroke',
  points,
  strokePx,
  box: boxAround(points, strokePx / 2),
})

/** A lozenge is a little wider than it is high, as a scribe's pen makes it. */
export const LOZENGE_STRETCH = 1.12

export function lozengeMark(
  name: MarkName,
  x: number,
  y: number,
  radiusPx: number,
  look: { isFilled: boolean; strokePx: number },
): Mark {
  const wide = radiusPx * LOZENGE_STRETCH
  const points: readonly Point[] = [
    [x, y - radiusPx],
    [x + wide, y],
    [x, y + radiusPx],
    [x - wide, y],
  ]
  return { ...name, kind: 'polygon', points, ...look, box: boxAround(points, look.strokePx * 0.7) }
}

/** An arch over the span from `from` to `to`, `heightPx` at its crown. */
export function archMark(
  name: MarkName,
  from: Point,
  to: Point,
  heightPx: number,
  look: { strokePx: number; isDashed: boolean },
): Mark {
  const control: Point = [(from[0] + to[0]) / 2, Math.min(from[1], to[1]) - 2 * heightPx]
  const crown: Point = [control[0], Math.min(from[1], to[1]) - heightPx]
  return {
    ...name,
    kind: 'curve',
    from,
    control,
    to,
    ...look,
    box: boxAround([from, crown, to], look.strokePx / 2),
  }
}

/** A tie from `from` to `to`, bowed upwards by `bowPx` at its crown, or downwards where that is negative. */
export function crescentMark(
  name: MarkName,
  from: Point,
  to: Point,
  bowPx: number,
  thicknessPx: number,
): Mark {
  const middle = (from[0] + to[0]) / 2
  const y = (from[1] + to[1]) / 2
  const outer: Point = [middle, y - 2 * bowPx]
  const inner: Point = [middle, y - 2 * bowPx + Math.sign(bowPx) * 2 * thicknessPx]
  return {
    ...name,
    kind: 'crescent',
    from,
    outer,
    inner,
    to,
    box: boxAround([from, [middle, y - bowPx], to], 0),
  }
}

/** A beam between two points of its outer edge, `thicknessPx` thick towards the heads: downwards where it is positive. */
export function beamMark(name: MarkName, from: Point, to: Point, thicknessPx: number): Mark {
  const points: readonly Point[] = [from, to, [to[0], to[1] + thicknessPx], [from[0], from[1] + thicknessPx]]
  return { ...name, kind: 'polygon', points, isFilled: true, strokePx: 0, box: boxAround(points, 0) }
}

export type TextLook = Readonly<{ face: FaceName; sizePx: number; anchor: 'start' | 'middle' | 'end' }>

/** A text whose start, middle or end stands at `x`, on the baseline `y`. */
export function textMark(name: MarkName, text: string, x: number, y: number, look: TextLook): Mark {
  const { face, sizePx, anchor } = look
  const widthPx = measureTextPx(text, face, sizePx)
  const left = anchor === 'start' ? x : anchor === 'middle' ? x - widthPx / 2 : x - widthPx
  const { above, below } = textHeightPx(text, face, sizePx)
  const box = { left, right: left + widthPx, top: y - above, bottom: y + below }
  return { ...name, kind: 'text', text, face, sizePx, x: left, y, box }
}

const movePoint = ([x, y]: Point, dx: number, dy: number): Point => [x + dx, y + dy]

export function moveMark(mark: Mark, dx: number, dy: number): Mark {
  const box = moveBox(mark.box, dx, dy)
  switch (mark.kind) {
    case 'glyph':
    case 'text':
      return { ...mark, x: mark.x + dx, y: mark.y + dy, box }
    case 'rectangle':
      return { ...mark, box }
    case 'polygon':
    case 'stroke':
      return { ...mark, points: mark.points.map((point) => movePoint(point, dx, dy)), box }
    case 'crescent':
      return {
        ...mark,
        from: movePoint(mark.from, dx, dy),
        outer: movePoint(mark.outer, dx, dy),
        inner: movePoint(mark.inner, dx, dy),
        to: movePoint(mark.to, dx, dy),
        box,
      }
    case 'curve':
      return {
        ...mark,
        from: movePoint(mark.from, dx, dy),
        control: movePoint(mark.control, dx, dy),
        to: movePoint(mark.to, dx, dy),
        box,
      }
  }
}

/** Thickness of a line in whole px, so that it is crisp on a plain screen: never less than one. */
export const crispPx = (staffSpaces: number, spacePx: number): number =>
  Math.max(1, Math.floor(staffSpaces * spacePx + 0.25))

/** A horizontal or vertical line as a rectangle on whole px. */
export function ruleMark(name: MarkName, from: Point, to: Point, thicknessPx: number): Mark {
  const half = thicknessPx / 2
  const [x1, y1] = from
  const [x2, y2] = to
  if (y1 === y2) {
    const top = Math.round(y1 - half)
    return rectangleMark(name, { left: x1, right: x2, top, bottom: top + thicknessPx })
  }
  const left = Math.round(x1 - half)
  return rectangleMark(name, { left, right: left + thicknessPx, top: y1, bottom: y2 })
}

export const staffLinePx = (spacePx: number): number =>
  crispPx(ENGRAVING_DEFAULTS.staffLineThickness, spacePx)

/** A bar line is a little thicker than a staff line; on small staves, where a px is much, as thick. */
export const barlinePx = (spacePx: number): number =>
  Math.max(staffLinePx(spacePx), Math.floor(ENGRAVING_DEFAULTS.thinBarlineThickness * spacePx - 0.1))
