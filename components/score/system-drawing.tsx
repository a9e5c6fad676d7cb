import { memo, useMemo } from 'react'
import { G, Rect } from 'react-native-svg'
import { MOTION_MS, useTheme, type Pigments } from '@/components/theme'
import { paintMarks } from '@/shared/notation/paint-marks'
import type { BarLayout, SystemLayout } from '@/shared/notation/score-layout'
import { colorOf, washed } from './inks'
import { PaintedMarks } from './painted-marks'
import { easedTransform } from './eased'

/** Bars a finding speaks of, tinted while a reader points at it. */
export type Highlight = Readonly<{ fromBar: number; toBar: number; tone: 'breach' | 'remark' | 'quiet' }>

/** How much of its tone lies over the bars a finding speaks of. */
const WASH = 0.12

type BarProps = Readonly<{ bar: BarLayout; colors: Pigments; ground: string; easeMs: number }>

function BarDrawing({ bar, colors, ground, easeMs }: BarProps) {
  const painted = useMemo(() => paintMarks(bar.marks), [bar.marks])
  return (
    <G {...easedTransform(bar.xPx, 0, easeMs)}>
      <PaintedMarks painted={painted} colors={colors} ground={ground} />
    </G>
  )
}

type Props = Readonly<{
  system: SystemLayout
  spacePx: number
  ground: string
  handBar: number | null
  highlight: Highlight | null
  /** The strip pins its clefs elsewhere. */
  hasPrefix: boolean
}>

/** One system: what is under the bars, the bars, and what spans them. */
export const SystemDrawing = memo(function SystemDrawing(props: Props) {
  const { system, spacePx, ground, handBar, highlight, hasPrefix } = props
  const { colors, isMotionReduced } = useTheme()
  const easeMs = isMotionReduced ? 0 : MOTION_MS
  const lines = useMemo(() => paintMarks(system.staffLines), [system.staffLines])
  const prefix = useMemo(() => paintMarks(system.prefix), [system.prefix])
  const spans = useMemo(() => paintMarks(system.spans), [system.spans])
  const isLit = ({ number }: BarLayout): boolean =>
    highlight !== null && number >= highlight.fromBar && number <= highlight.toBar
  const groundOf = (bar: BarLayout): string => {
    const under = bar.number === handBar ? colors.leaf : ground
    return highlight !== null && isLit(bar) ? washed(under, colorOf(highlight.tone, colors), WASH) : under
  }
  const hand = system.bars.find(({ number }) => number === handBar)
  const top = system.stavesBox.top - spacePx
  return (
    <G x={system.xPx} y={system.yPx}>
      {hand && (
        <G {...easedTransform(hand.xPx, 0, easeMs)}>
          <Rect x={1} y={0} width={hand.widthPx - 2} height={system.heightPx} fill={colors.leaf} />
        </G>
      )}
      {system.bars.filter(isLit).map((bar) => (
        <G key={bar.number} {...easedTransform(bar.xPx, 0, easeMs)}>
          <Rect
            x={0}
            y={top}
            width={bar.widthPx}
            height={system.stavesBox.bottom + spacePx - top}
            fill={groundOf(bar)}
          />
        </G>
      ))}
      <PaintedMarks painted={lines} colors={colors} ground={ground} />
      {hasPrefix && <PaintedMarks painted={prefix} colors={colors} ground={ground} />}
      {system.bars.map((bar) => (
        <BarDrawing key={bar.number} bar={bar} colors={colors} ground={groundOf(bar)} easeMs={easeMs} />
      ))}
      <PaintedMarks painted={spans} colors={colors} ground={ground} />
    </G>
  )
})
