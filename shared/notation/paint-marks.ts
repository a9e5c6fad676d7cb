import { glyphPath } from '@/shared/notation/glyph-path'
import type { Ink, Mark, Point } from '@/shared/notation/mark'
import type { FaceName } from '@/shared/notation/text-widths'

/** A path of SVG with all marks that share one paint. `ground` is whatever the bar stands on. */
export type PaintedPath = Readonly<{
  kind: 'path'
  d: string
  fill: Ink | 'ground' | null
  stroke: Ink | null
  strokePx: number
  isDashed: boolean
}>

export type PaintedText = Readonly<{
  kind: 'text'
  text: string
  face: FaceName
  sizePx: number
  x: number
  y: number
  ink: Ink
  /** Numbers among the staff lines have a rim of the ground, so that no line crosses them. */
  hasRim: boolean
}>

export type Painted = PaintedPath | PaintedText

type Paint = Omit<PaintedPath, 'kind' | 'd'> & Readonly<{ layer: number }>

const round = (value: number): number => Math.round(value * 100) / 100
const at = ([x, y]: Point): string => `${round(x)} ${round(y)}`

/** Lines lie under hollow lozenges, which hide them; what is solid comes last. */
function paintOf(mark: Exclude<Mark, { kind: 'text' }>): Paint {
  const solid = { fill: mark.ink, stroke: null, strokePx: 0, isDashed: false }
  switch (mark.kind) {
    case 'rectangle':
      return { ...solid, layer: 0 }
    case 'crescent':
      return { ...solid, layer: 3 }
    case 'glyph':
      return { ...solid, layer: 3 }
    case 'polygon':
      if (mark.strokePx === 0) return { ...solid, layer: 3 }
      return {
        layer: mark.isFilled ? 2 : 1,
        fill: mark.isFilled ? mark.ink : 'ground',
        stroke: mark.ink,
        strokePx: mark.strokePx,
        isDashed: false,
      }
    case 'stroke':
      return { layer: 0, fill: null, stroke: mark.ink, strokePx: mark.strokePx, isDashed: false }
    case 'curve':
      return { layer: 0, fill: null, stroke: mark.ink, strokePx: mark.strokePx, isDashed: mark.isDashed }
  }
}

function pathOf(mark: Exclude<Mark, { kind: 'text' }>): string {
  switch (mark.kind) {
    case 'glyph':
      return glyphPath(mark.glyph, mark.x, mark.y, mark.spacePx)
    case 'rectangle': {
      const { left, top, right, bottom } = mark.box
      return `M${at([left, top])}H${round(right)}V${round(bottom)}H${round(left)}Z`
    }
    case 'polygon':
      return `M${mark.points.map(at).join('L')}Z`
    case 'stroke':
      return `M${mark.points.map(at).join('L')}`
    case 'crescent':
      return `M${at(mark.from)}Q${at(mark.outer)} ${at(mark.to)}Q${at(mark.inner)} ${at(mark.from)}Z`
    case 'curve':
      return `M${at(mark.from)}Q${at(mark.control)} ${at(mark.to)}`
  }
}

/** Marks as few paths as their paints allow, in the order they are to be drawn, the lettering last. */
export function paintMarks(marks: readonly Mark[]): readonly Painted[] {
  const paths = new Map<string, { paint: Paint; parts: string[] }>()
  const texts: PaintedText[] = []
  for (const mark of marks) {
    if (mark.kind === 'text') {
      const { text, face, sizePx, ink } = mark
      texts.push({
        kind: 'text',
        text,
        face,
        sizePx,
        ink,
        hasRim: mark.role === 'count',
        x: round(mark.x),
        y: round(mark.y),
      })
      continue
    }
    const paint = paintOf(mark)
    const key = JSON.stringify(paint)
    const entry = paths.get(key) ?? { paint, parts: [] }
    entry.parts.push(pathOf(mark))
    paths.set(key, entry)
  }
  const painted = [...paths.values()]
    .sort((a, b) => a.paint.layer - b.paint.layer)
    .map(({ paint: { layer: _, ...paint }, parts }): PaintedPath => ({
      kind: 'path',
      d: parts.join(''),
      ...paint,
    }))
  return [...painted, ...texts]
}
