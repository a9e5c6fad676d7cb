import { memo } from 'react'
import Svg, { Path } from 'react-native-svg'
import type { BarMotion } from '@/shared/notation/score-input'

/** Two strokes, the upper and the lower voice, as on the rail between the staves. */
const STROKES: Readonly<Record<BarMotion, string>> = {
  similar: 'M3 8L27 3M3 19L27 14',
  parallel: 'M3 9L27 3M3 19L27 13',
  oblique: 'M3 6L27 6M3 19L27 11',
  contrary: 'M3 9L27 3M3 13L27 19',
}

export const MotionGlyph = memo(function MotionGlyph({
  motion,
  color,
}: Readonly<{ motion: BarMotion; color: string }>) {
  return (
    <Svg width={30} height={22} viewBox="0 0 30 22" aria-hidden>
      <Path d={STROKES[motion]} stroke={color} strokeWidth={2.4} strokeLinecap="round" fill="none" />
    </Svg>
  )
})
