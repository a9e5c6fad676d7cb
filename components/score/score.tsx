import { memo, useCallback, useMemo } from 'react'
import { StyleSheet, View } from 'react-native'
import { Svg } from 'react-native-svg'
import { MOTION_MS, useTheme } from '@/components/theme'
import { useWords } from '@/components/words'
import type { Playhead } from '@/shared/notation/hit-test'
import { layoutScore } from '@/shared/notation/layout-score'
import type { ScoreInput } from '@/shared/notation/score-input'
import type { ScoreLayout, ScoreSize } from '@/shared/notation/score-layout'
import { stripOffsetPx } from '@/shared/notation/strip-offset'
import type { PitchName } from '@/shared/theory/pitch'
import { BarButtons } from './bar-buttons'
import { easedTransform } from './eased'
import { Ghost } from './ghost'
import { PlayheadLine } from './playhead-line'
import { StripClefs } from './strip-clefs'
import { SystemDrawing, type Highlight } from './system-drawing'
import { useStaffPointer } from './use-staff-pointer'

export type ScoreProps = Readonly<{
  input: ScoreInput
  size: ScoreSize
  /** Width of the drawing in px. The height follows from the music. */
  width: number
  /** On a wall or a page: shrink the staff, within reason, to keep to this height. */
  maxHeight?: number | undefined
  /** The bar being worked on, by number: lit, and in the middle of a strip. */
  handBar?: number | null | undefined
  onPressBar?: ((bar: number) => void) | undefined
  /** The keyboard's focus came to a bar: for whoever writes by letters. */
  onReachBar?: ((bar: number) => void) | undefined
  /** A click or the end of a drag on the staff that is being written. The bar's own press is then not told. */
  onPressStaff?: ((bar: number, pitch: PitchName) => void) | undefined
  /** Bars whose staff takes a press; all of them when left out. */
  isBarOpen?: ((bar: number) => boolean) | undefined
  playhead?: Playhead | null | undefined
  highlight?: Highlight | null | undefined
  /** The colour the score stands on, where it is not the page's: hollow lozenges show it. */
  ground?: string | undefined
  accessibilityLabel?: string | undefined
}>

const everyBar = (): boolean => true

type SheetProps = Readonly<{
  layout: ScoreLayout
  ground: string
  handBar: number | null
  highlight: Highlight | null
}>

/** The drawing itself, which a moving playhead or pointer leaves alone. */
const Sheet = memo(function Sheet({ layout, ground, handBar, highlight }: SheetProps) {
  return (
    <Svg width={layout.widthPx} height={layout.heightPx} aria-hidden style={styles.sheet}>
      {layout.systems.map((system, i) => (
        <SystemDrawing
          key={i}
          system={system}
          spacePx={layout.spacePx}
          ground={ground}
          handBar={handBar}
          highlight={highlight}
          hasPrefix={layout.size !== 'strip'}
        />
      ))}
    </Svg>
  )
})

/** A score, engraved and drawn. See `ScoreInput` for what it shows and `ScoreSize` for where it is read. */
export function Score(props: ScoreProps) {
  // A place that has not been measured yet has no width.
  return props.width >= 1 ? <EngravedScore {...props} /> : null
}

function EngravedScore(props: ScoreProps) {
  const { input, size, width, maxHeight, onPressBar, onPressStaff, playhead = null, highlight = null } = props
  const { colors, isMotionReduced } = useTheme()
  const words = useWords()
  const handBar = props.handBar ?? null
  const ground = props.ground ?? colors.vellum
  const widthPx = Math.floor(width)
  // Only a strip changes shape with the bar in hand.
  const handInLayout = size === 'strip' ? (handBar ?? undefined) : undefined
  const layout = useMemo(
    () => layoutScore(input, { size, widthPx, maxHeightPx: maxHeight, handBar: handInLayout }),
    [input, size, widthPx, maxHeight, handInLayout],
  )
  const pointer = useStaffPointer(layout, onPressStaff, props.isBarOpen ?? everyBar)
  const { takePress } = pointer
  const pressBar = useCallback(
    (bar: number) => {
      if (!takePress()) onPressBar?.(bar)
    },
    [takePress, onPressBar],
  )
  const isStrip = size === 'strip'
  const followed = playhead?.bar ?? handBar
  const strip = isStrip ? layout.systems[0] : undefined
  const offsetPx = strip ? stripOffsetPx(strip, followed, widthPx) : 0

  return (
    <View
      // A mini is one picture; elsewhere every bar is told.
      role={size === 'mini' ? 'img' : 'group'}
      aria-label={props.accessibilityLabel ?? words.score.score}
      style={[styles.window, { width: widthPx, height: layout.heightPx }]}
    >
      <View
        {...(isStrip ? easedTransform(-offsetPx, 0, isMotionReduced ? 0 : MOTION_MS) : null)}
        {...pointer.handlers}
      >
        <Sheet layout={layout} ground={ground} handBar={handBar} highlight={highlight} />
        {size !== 'mini' && (
          <BarButtons
            layout={layout}
            bars={input.bars}
            handBar={handBar}
            onPressBar={onPressBar ? pressBar : null}
            onReachBar={props.onReachBar}
          />
        )}
        {playhead && <PlayheadLine layout={layout} playhead={playhead} />}
        {pointer.ghost && (
          <Ghost layout={layout} hit={pointer.ghost} isHeld={pointer.isHeld} ground={ground} />
        )}
      </View>
      {isStrip && <StripClefs layout={layout} ground={ground} isMoved={offsetPx > 0} />}
    </View>
  )
}

const styles = StyleSheet.create({
  window: { overflow: 'hidden', userSelect: 'none' },
  sheet: { display: 'flex', pointerEvents: 'none' },
})
