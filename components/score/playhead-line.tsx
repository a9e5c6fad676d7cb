import { View } from 'react-native'
import { useTheme } from '@/components/theme'
import { playheadPlace, type Playhead } from '@/shared/notation/hit-test'
import type { ScoreLayout } from '@/shared/notation/score-layout'

/** The line that follows the sound. It is told where to stand as often as the screen is drawn. */
export function PlayheadLine({ layout, playhead }: Readonly<{ layout: ScoreLayout; playhead: Playhead }>) {
  const { colors } = useTheme()
  const place = playheadPlace(layout, playhead)
  if (!place) return null
  const widthPx = Math.max(2, Math.round(0.16 * layout.spacePx))
  return (
    <View
      aria-hidden
      {...({ dataSet: { playhead: playhead.bar } } as object)}
      style={{
        position: 'absolute',
        pointerEvents: 'none',
        left: -widthPx / 2,
        top: 0,
        width: widthPx,
        height: place.bottomPx - place.topPx,
        backgroundColor: colors.azurite,
        opacity: 0.75,
        transform: [{ translateX: place.xPx }, { translateY: place.topPx }],
      }}
    />
  )
}
