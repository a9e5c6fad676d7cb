import { memo, useMemo } from 'react'
import { View } from 'react-native'
import { Svg } from 'react-native-svg'
import { useTheme } from '@/components/theme'
import { paintMarks } from '@/shared/notation/paint-marks'
import type { ScoreLayout } from '@/shared/notation/score-layout'
import { staffLineMarks } from '@/shared/notation/system-marks'
import { PaintedMarks } from './painted-marks'

/** What is on the staff goes out of sight softly beside the clefs; the staff itself runs on. */
const fadeFrom = (ground: string, leftPx: number, widthPx: number): object => ({
  style: {
    position: 'absolute',
    left: leftPx,
    top: 0,
    bottom: 0,
    width: widthPx,
    // A web style that the native types do not know.
    backgroundImage: `linear-gradient(to right, ${ground}, ${ground}00)`,
  },
})

type Props = Readonly<{ layout: ScoreLayout; ground: string; isMoved: boolean }>

/** Clefs and signature of a strip, which stay while the bars pass under them. */
export const StripClefs = memo(function StripClefs({ layout, ground, isMoved }: Props) {
  const { colors } = useTheme()
  const system = layout.systems[0]
  const painted = useMemo(
    () =>
      system
        ? paintMarks([
            ...staffLineMarks(system.staves, system.prefixPx + layout.spacePx, layout.spacePx),
            ...system.prefix,
          ])
        : [],
    [system, layout.spacePx],
  )
  if (!system) return null
  return (
    <View aria-hidden style={{ position: 'absolute', pointerEvents: 'none', left: 0, top: 0 }}>
      <View
        style={{
          position: 'absolute',
          left: 0,
          top: 0,
          bottom: 0,
          width: system.prefixPx,
          backgroundColor: ground,
        }}
      />
      {isMoved && <View {...fadeFrom(ground, system.prefixPx, layout.spacePx)} />}
      <View>
        <Svg width={system.prefixPx + layout.spacePx} height={layout.heightPx} style={{ display: 'flex' }}>
          <PaintedMarks painted={painted} colors={colors} ground={ground} />
        </Svg>
      </View>
    </View>
  )
})
