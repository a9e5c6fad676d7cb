import { moveMark, type Ink, type Mark } from '@/shared/notation/mark'
import { paintMarks } from '@/shared/notation/paint-marks'
import type { ScoreLayout } from '@/shared/notation/score-layout'
import type { FaceName } from '@/shared/notation/text-widths'

/** Pigments of the two grounds, as the picture harness draws them; the app takes its own from the theme. */
export const PIGMENTS = {
  light: {
    vellum: '#F2F4F0',
    lampblack: '#16211F',
    azurite: '#1E4E79',
    verdigris: '#0E6B5C',
    minium: '#B5301A',
    orpiment: '#8A5A00',
    lead: '#5B6763',
  },
  dark: {
    vellum: '#12181B',
    lampblack: '#E9EEEA',
    azurite: '#8CC1EE',
    verdigris: '#6FD3BD',
    minium: '#FF8C73',
    orpiment: '#F2C14E',
    lead: '#A6B3AE',
  },
} as const

const INK: Readonly<Record<Ink | 'ground', [keyof (typeof PIGMENTS)['light'], number]>> = {
  ground: ['vellum', 1],
  cantus: ['lampblack', 1],
  line: ['azurite', 1],
  breach: ['minium', 1],
  remark: ['orpiment', 1],
  quiet: ['lead', 1],
  released: ['verdigris', 1],
  staff: ['lampblack', 0.62],
  barline: ['lampblack', 0.8],
  hatch: ['lead', 0.6],
}

const FACES: Readonly<Record<FaceName, string>> = {
  Alegreya: "font-family='Alegreya'",
  AlegreyaItalic: "font-family='AlegreyaItalic'",
  AlegreyaSans: "font-family='AlegreyaSans'",
  AlegreyaSansMedium: "font-family='AlegreyaSansMedium'",
}

/** Every mark of a layout, placed from the score's own corner. */
export const allMarks = (layout: ScoreLayout): readonly Mark[] =>
  layout.systems.flatMap((system) => [
    ...[...system.staffLines, ...system.prefix, ...system.spans].map((mark) =>
      moveMark(mark, system.xPx, system.yPx),
    ),
    ...system.bars.flatMap((bar) =>
      bar.marks.map((mark) => moveMark(mark, system.xPx + bar.xPx, system.yPx)),
    ),
  ])

const escape = (text: string): string => text.replace(/[&<>]/g, (c) => `&#${c.charCodeAt(0)};`)

/** A layout as a standalone SVG, to be looked at. */
export function renderSvg(layout: ScoreLayout, ground: keyof typeof PIGMENTS): string {
  const colour = (ink: Ink | 'ground' | null, kind: string): string => {
    if (ink === null) return `${kind}='none'`
    const [pigment, opacity] = INK[ink]
    return `${kind}='${PIGMENTS[ground][pigment]}' ${kind}-opacity='${opacity}'`
  }
  const body = paintMarks(allMarks(layout)).map((painted) =>
    painted.kind === 'path'
      ? `<path d='${painted.d}' ${colour(painted.fill, 'fill')} ${colour(painted.stroke, 'stroke')} stroke-width='${painted.strokePx}' ${painted.isDashed ? `stroke-dasharray='${3 * painted.strokePx} ${2 * painted.strokePx}'` : ''}/>`
      : `<text x='${painted.x}' y='${painted.y}' ${FACES[painted.face]} font-size='${painted.sizePx}' ${colour(painted.ink, 'fill')} stroke='${painted.hasRim ? PIGMENTS[ground].vellum : 'none'}' stroke-width='${painted.sizePx / 4}' paint-order='stroke'>${escape(painted.text)}</text>`,
  )
  const { widthPx, heightPx } = layout
  return `<svg xmlns='http://www.w3.org/2000/svg' width='${widthPx}' height='${heightPx}' style='font-variant-numeric:lining-nums;overflow:visible'>${body.join('')}</svg>`
}
