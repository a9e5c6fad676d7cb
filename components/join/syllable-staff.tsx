import { useState } from 'react'
import { useWindowDimensions, View } from 'react-native'
import Svg, { Line, Polygon } from 'react-native-svg'
import { fonts, leading, type, useTheme } from '@/components/theme'
import { useWords } from '@/components/words'
import { CODE_SYLLABLES, type Syllable } from '@/shared/api/lessons'

/** Half the width of a lozenge; the whole of it answers to a finger. */
const HALF_PX = 27
/** From one place of the staff to the next: half a staff space. Low screens have a flatter staff. */
const RISE_PX = 30
const LOW_RISE_PX = 23
const LOW_SCREEN_PX = 760
/** Do hangs under the staff on its own line, mi stands on the lowest line, the highest line is four thirds above it. */
const LINES = [2, 4, 6, 8, 10] as const
const TOP_PLACE = 10

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
  const { height } = useWindowDimensions()
  const risePx = height < LOW_SCREEN_PX ? LOW_RISE_PX : RISE_PX
  const heightPx = HALF_PX + TOP_PLACE * risePx + 2
  const yOf = (place: number) => heightPx - HALF_PX - place * risePx
  const placeOf = (index: number) => ({
    x: HALF_PX + 9 + (index * (widthPx - 2 * HALF_PX - 9)) / (CODE_SYLLABLES.length - 1),
    y: yOf(index),
  })
  const ledgerPx = HALF_PX + 9
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
            {LINES.map((place) => (
              <Line
                key={place}
                x1={0}
                x2={widthPx}
                y1={yOf(place)}
                y2={yOf(place)}
                stroke={colors.lead}
                strokeWidth={1}
                opacity={0.6}
              />
            ))}
            <Line
              x1={Math.max(0, placeOf(0).x - ledgerPx)}
              x2={placeOf(0).x + ledgerPx}
              y1={yOf(0)}
              y2={yOf(0)}
              stroke={colors.lead}
              strokeWidth={1}
              opacity={0.6}
            />
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
