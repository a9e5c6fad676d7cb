import { useMemo } from 'react'
import { View } from 'react-native'
import { Svg } from 'react-native-svg'
import { useTheme } from '@/components/theme'
import type { StaffHit } from '@/shared/notation/hit-test'
import { proposalMarks } from '@/shared/notation/note-marks'
import { paintMarks } from '@/shared/notation/paint-marks'
import { moveMark } from '@/shared/notation/mark'
import type { ScoreLayout } from '@/shared/notation/score-layout'
import { pitchOf } from '@/shared/theory/pitch'
import { PaintedMarks } from './painted-marks'

type Props = Readonly<{ layout: ScoreLayout; hit: StaffHit; isHeld: boolean; ground: string }>

/** The lozenge a click would leave, under the pointer. */
export function Ghost({ layout, hit, isHeld, ground }: Props) {
  const { colors } = useTheme()
  const { spacePx } = layout
  const clef = layout.systems[0]?.staves.find(({ voice }) => voice === layout.pressedVoice)?.clef
  const painted = useMemo(() => {
    if (!clef) return []
    const pitch = pitchOf(hit.pitch)
    const marks = proposalMarks(
      pitch,
      pitch.alteration,
      { tone: 'line', count: null },
      { clef, spacePx },
      { group: 'ghost', countSide: 'right' },
    )
    const lozenge = marks.find(({ role }) => role === 'lozenge')
    if (!lozenge) return []
    // The centre of the picture, which is twelve spaces square, so that every ledger line is in it.
    const dy = 6 * spacePx - (lozenge.box.top + lozenge.box.bottom) / 2
    return paintMarks(marks.map((mark) => moveMark(mark, 6 * spacePx, dy)))
  }, [clef, hit.pitch, spacePx])
  const sizePx = 12 * spacePx
  return (
    <View
      aria-hidden
      style={{
        position: 'absolute',
        pointerEvents: 'none',
        left: hit.xPx - sizePx / 2,
        top: hit.yPx - sizePx / 2,
        opacity: isHeld ? 0.9 : 0.5,
      }}
    >
      <Svg width={sizePx} height={sizePx}>
        <PaintedMarks painted={painted} colors={colors} ground={ground} />
      </Svg>
    </View>
  )
}
