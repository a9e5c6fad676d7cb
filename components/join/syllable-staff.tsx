import { useState } from 'react'
import { View } from 'react-native'
import Svg, { Line, Polygon } from 'react-native-svg'
import { fonts, leading, type, useTheme } from '@/components/theme'
import { useWords } from '@/components/words'
import { CODE_SYLLABLES, type Syllable } from '@/shared/api/lessons'

/** Half the width of a lozenge; the whole of it answers to a finger. */
const HALF_PX = 27
const RISE_PX = 30
/** On the narrowest phones the lozenges climb more steeply, so that none touches its neighbour. */
const NARROW_RISE_PX = 36
const NARROW_PX = 320

/** Seven lozenges climbing a staff, do to ti: the keys of a lesson's code. */
export function SyllableStaff({
  lastTapped,
  isDisabled,
  onTap,
}: Readonly<{ lastTapped: Syllable | null; isDisabled: boolean; onTap: (syllable: Syllable) => void }>) {
  const words = useWords().join
  const { colors } = useTheme()
  const [widthPx, setWidthPx] = useState(0)
  const [held, setHeld] = useState<Syllable | null>(null)
  const risePx = widthPx < NARROW_PX ? NARROW_RISE_PX : RISE_PX
  const heightPx = 2 * HALF_PX + 6 * risePx
  const placeOf = (index: number) => ({
    x: HALF_PX + (index * (widthPx - 2 * HALF_PX)) / (CODE_SYLLABLES.length - 1),
    y: heightPx - HALF_PX - index * risePx,
  })
  // The lowest line runs through re, so that do hangs under the staff and ti stands over it.
  const lines = [1, 2.25, 3.5, 4.75, 6].map((step) => heightPx - HALF_PX - step * risePx * 0.98)
  return (
    <View
      role="group"
      aria-label={words.staffLabel}
      onLayout={({ nativeEvent }) => setWidthPx(nativeEvent.layout.width)}
      style={{ height: heightPx, alignSelf: 'stretch' }}
    >
      {widthPx > 0 ? (
        <>
          <Svg width={widthPx} height={heightPx} aria-hidden style={{ position: 'absolute' }}>
            {lines.map((y) => (
              <Line
                key={y}
                x1={0}
                x2={widthPx}
                y1={y}
                y2={y}
                stroke={colors.lead}
                strokeWidth={1}
                opacity={0.6}
              />
            ))}
            {CODE_SYLLABLES.map((syllable, index) => {
              const { x, y } = placeOf(index)
              const isLit = syllable === (held ?? lastTapped)
              return (
                <Polygon
                  key={syllable}
                  points={`${x},${y - HALF_PX + 1} ${x + HALF_PX - 1},${y} ${x},${y + HALF_PX - 1} ${x - HALF_PX + 1},${y}`}
                  fill={isLit ? colors.azurite : colors.vellum}
                  stroke={colors.azurite}
                  strokeWidth={2}
                />
              )
            })}
          </Svg>
          {CODE_SYLLABLES.map((syllable, index) => {
            const { x, y } = placeOf(index)
            const isLit = syllable === (held ?? lastTapped)
            return (
              <button
                key={syllable}
                type="button"
                aria-label={words.syllableHint(syllable)}
                aria-disabled={isDisabled}
                onPointerDown={() => setHeld(syllable)}
                onPointerUp={() => setHeld(null)}
                onPointerLeave={() => setHeld(null)}
                onClick={() => {
                  if (!isDisabled) onTap(syllable)
                }}
                style={{
                  position: 'absolute',
                  left: x - HALF_PX,
                  top: y - HALF_PX,
                  width: 2 * HALF_PX,
                  height: 2 * HALF_PX,
                  padding: 0,
                  border: 0,
                  background: 'none',
                  borderRadius: HALF_PX,
                  color: isLit ? colors.vellum : colors.lampblack,
                  font: `${type.text}px/${leading.text}px ${fonts.AlegreyaSansMedium}`,
                  cursor: isDisabled ? 'auto' : 'pointer',
                  touchAction: 'manipulation',
                }}
              >
                {syllable}
              </button>
            )
          })}
        </>
      ) : null}
    </View>
  )
}
