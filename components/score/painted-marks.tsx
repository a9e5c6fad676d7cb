import { memo } from 'react'
import { Path, Text } from 'react-native-svg'
import type { Pigments } from '@/components/theme'
import type { Painted, PaintedPath, PaintedText } from '@/shared/notation/paint-marks'
import { colorOf, familyOf } from './inks'

type Props = Readonly<{ painted: readonly Painted[]; colors: Pigments; ground: string }>

function PaintedShape({
  path,
  colors,
  ground,
}: Readonly<{ path: PaintedPath; colors: Pigments; ground: string }>) {
  const fill = path.fill === null ? 'none' : path.fill === 'ground' ? ground : colorOf(path.fill, colors)
  return (
    <Path
      d={path.d}
      fill={fill}
      stroke={path.stroke === null ? 'none' : colorOf(path.stroke, colors)}
      strokeWidth={path.strokePx}
      strokeLinecap="round"
      {...(path.isDashed ? { strokeDasharray: [3 * path.strokePx, 2.5 * path.strokePx] } : null)}
    />
  )
}

const LETTERING = { fontVariantNumeric: 'lining-nums' }
const RIMMED = { ...LETTERING, paintOrder: 'stroke', strokeLinejoin: 'round' }

function PaintedWords({
  words,
  colors,
  ground,
}: Readonly<{ words: PaintedText; colors: Pigments; ground: string }>) {
  return (
    <Text
      x={words.x}
      y={words.y}
      fill={colorOf(words.ink, colors)}
      fontFamily={familyOf(words.face)}
      fontSize={words.sizePx}
      stroke={words.hasRim ? ground : 'none'}
      strokeWidth={words.sizePx / 4}
      // Web styles that the native types do not know.
      {...({ style: words.hasRim ? RIMMED : LETTERING } as object)}
    >
      {words.text}
    </Text>
  )
}

const isSamePainted = (a: Painted, b: Painted | undefined): boolean => {
  if (b === undefined || a.kind !== b.kind) return false
  const [one, other] = [a, b] as unknown as [Record<string, unknown>, Record<string, unknown>]
  return Object.keys(one).every((key) => one[key] === other[key])
}

/** Two drawings that look alike need not be drawn again, though every layout makes new ones. */
const isSameDrawing = (a: Props, b: Props): boolean =>
  a.colors === b.colors &&
  a.ground === b.ground &&
  a.painted.length === b.painted.length &&
  a.painted.every((painted, i) => isSamePainted(painted, b.painted[i]))

/** Marks as SVG. Drawn anew only when one of them has changed. */
export const PaintedMarks = memo(function PaintedMarks({ painted, colors, ground }: Props) {
  return painted.map((one, i) =>
    one.kind === 'path' ? (
      <PaintedShape key={i} path={one} colors={colors} ground={ground} />
    ) : (
      <PaintedWords key={i} words={one} colors={colors} ground={ground} />
    ),
  )
}, isSameDrawing)
