import { useCallback, useEffect, useLayoutEffect, useRef, useState } from 'react'
import { ScrollView, View } from 'react-native'
import type { BarMotion } from '@/shared/notation/score-input'
import { Rung, RUNG_PX } from './rung'

export type LadderRung = Readonly<{
  name: string
  /** Letter as typed on a keyboard, for moving by letter. */
  letter: string
  interval: string
  motion: BarMotion | null
  mark: 'breach' | 'remark' | null
  spoken: string
}>

export type LadderProps = Readonly<{
  label: string
  hint: string
  /** From the highest pitch down. */
  rungs: readonly LadderRung[]
  /** What to say at the end of each rung, in the same order; empty when nothing is said. */
  ways?: readonly (string | null)[]
  /** The rung that is proposed, or null. */
  chosen: number | null
  /** The rung to show when a bar is taken in hand. */
  home: number
  /** Changes when another bar is taken in hand. */
  bar: number
  onChoose: (index: number) => void
  onHear: (index: number) => void
  onErase: () => void
  onStep: (by: 1 | -1) => void
  /** The rung that a letter means, seen from another. */
  rungOfLetter: (letter: string, from: number) => number | null
}>

/** A sweep is longer than a shaky tap and flatter than a scroll. */
const SWEEP_PX = 48

type KeyPress = Readonly<{
  key: string
  ctrlKey: boolean
  metaKey: boolean
  altKey: boolean
  preventDefault: () => void
}>
type Touch = Readonly<{ nativeEvent: Readonly<{ pageX: number; pageY: number }> }>

/**
 * The pitches at hand as a run of rungs, high ones up. A tap proposes, a second tap sounds, a sweep sideways goes to the
 * next bar. By keyboard: arrows move, a letter jumps, Enter proposes, Space sounds, Backspace takes away.
 */
export function Ladder(props: LadderProps) {
  const { rungs, chosen, home, bar } = props
  const [hand, setHand] = useState(chosen ?? home)
  const scroll = useRef<ScrollView>(null)
  const list = useRef<View>(null)
  const heightPx = useRef(0)
  const sweep = useRef<Readonly<{ x: number; y: number }> | null>(null)

  const showRung = useCallback((index: number) => {
    const top = (index + 0.5) * RUNG_PX - heightPx.current / 2
    scroll.current?.scrollTo({ y: Math.max(0, top), animated: false })
  }, [])

  // A bar taken in hand opens at its own place; a note chosen in it does not move the rungs under the finger.
  useLayoutEffect(() => {
    const index = chosen ?? home
    setHand(index)
    showRung(index)
    // eslint-disable-next-line react-hooks/exhaustive-deps -- only another bar or another ladder moves the rungs
  }, [bar, rungs.length])

  const latest = useRef(props)
  useEffect(() => {
    latest.current = props
  })

  const press = useCallback((index: number) => {
    const { chosen: at, onHear, onChoose } = latest.current
    setHand(index)
    if (at === index) onHear(index)
    else onChoose(index)
  }, [])

  const moveTo = (index: number) => {
    const target = Math.min(rungs.length - 1, Math.max(0, index))
    setHand(target)
    const element = (list.current as unknown as HTMLElement | null)?.querySelector<HTMLElement>(
      `[data-rung="${target}"]`,
    )
    element?.focus()
    element?.scrollIntoView({ block: 'nearest' })
  }

  const onKeyDown = (event: KeyPress) => {
    if (event.ctrlKey || event.metaKey || event.altKey) return
    const act = keyAct(event.key, hand, props, moveTo)
    if (!act) return
    event.preventDefault()
    act()
  }

  return (
    <ScrollView
      ref={scroll}
      style={{ flex: 1, minHeight: 0 }}
      onLayout={({ nativeEvent }) => {
        const isFirst = heightPx.current === 0
        heightPx.current = nativeEvent.layout.height
        if (isFirst) showRung(chosen ?? home)
      }}
    >
      <View
        ref={list}
        role="radiogroup"
        aria-label={props.label}
        style={{ touchAction: 'pan-y' } as object}
        {...({ onKeyDown, title: props.hint } as object)}
        onTouchStart={(event: Touch) => {
          sweep.current = { x: event.nativeEvent.pageX, y: event.nativeEvent.pageY }
        }}
        onTouchEnd={(event: Touch) => {
          const from = sweep.current
          sweep.current = null
          if (!from) return
          const dx = event.nativeEvent.pageX - from.x
          const dy = event.nativeEvent.pageY - from.y
          if (Math.abs(dx) >= SWEEP_PX && Math.abs(dx) > 2 * Math.abs(dy)) props.onStep(dx < 0 ? 1 : -1)
        }}
      >
        {rungs.map((rung, index) => (
          <Rung
            key={index}
            index={index}
            name={rung.name}
            interval={rung.interval}
            motion={rung.motion}
            mark={rung.mark}
            ways={props.ways?.[index] ?? null}
            spoken={rung.spoken}
            isOn={index === chosen}
            isTabStop={index === hand}
            isFaint={rung.mark === 'breach'}
            onPress={press}
          />
        ))}
      </View>
    </ScrollView>
  )
}

/** What a key means on the ladder; null leaves it to the browser. */
function keyAct(
  key: string,
  hand: number,
  props: LadderProps,
  moveTo: (index: number) => void,
): (() => void) | null {
  switch (key) {
    case 'ArrowUp':
      return () => moveTo(hand - 1)
    case 'ArrowDown':
      return () => moveTo(hand + 1)
    case 'PageUp':
      return () => moveTo(hand - 7)
    case 'PageDown':
      return () => moveTo(hand + 7)
    case 'ArrowRight':
      return () => props.onStep(1)
    case 'ArrowLeft':
      return () => props.onStep(-1)
    case 'Enter':
      return () => (props.chosen === hand ? props.onHear(hand) : props.onChoose(hand))
    case ' ':
      return () => props.onHear(hand)
    case 'Backspace':
    case 'Delete':
      return props.onErase
    default: {
      if (!/^[a-gA-G]$/.test(key)) return null
      return () => {
        const index = props.rungOfLetter(key, hand)
        if (index !== null) moveTo(index)
      }
    }
  }
}
