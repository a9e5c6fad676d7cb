import { memo, useEffect, useRef, useState } from 'react'
import { Pressable, StyleSheet, View } from 'react-native'
import { useWords } from '@/components/words'
import type { ScoreBar } from '@/shared/notation/score-input'
import type { ScoreLayout } from '@/shared/notation/score-layout'
import { describeBar } from './describe-bar'

type Props = Readonly<{
  layout: ScoreLayout
  bars: readonly ScoreBar[]
  handBar: number | null
  onPressBar: ((bar: number) => void) | null
  /** Told when the keyboard's focus comes to a bar. */
  onReachBar?: ((bar: number) => void) | undefined
}>

type Focusable = Readonly<{ focus: () => void }>

const NEXT: Readonly<Record<string, number>> = { ArrowRight: 1, ArrowLeft: -1 }

/**
 * The bars as the keyboard and a screen reader find them, over the drawing: one stop of the tab key, arrows from bar to
 * bar, Enter to press. Where nothing can be pressed they are only read.
 */
export const BarButtons = memo(function BarButtons(props: Props) {
  const { layout, bars, handBar, onPressBar, onReachBar } = props
  const words = useWords()
  const [reached, setReached] = useState<number | null>(null)
  const nodes = useRef(new Map<number, Focusable>())
  const numbers = bars.map(({ number }) => number)
  const stop = [reached, handBar].find((bar) => bar !== null && numbers.includes(bar)) ?? numbers[0]

  // While a bar has the focus and the hand goes on to another, as in writing by letters, the focus goes along.
  useEffect(() => {
    const hand = handBar === null ? undefined : nodes.current.get(handBar)
    const holder: unknown = document.activeElement
    if (hand && hand !== holder && [...nodes.current.values()].some((node) => node === holder)) hand.focus()
  }, [handBar])

  const places = layout.systems.flatMap((system) =>
    system.bars.map((bar) => ({
      bar: bars[bar.index] as ScoreBar,
      style: {
        transform: `translate(${system.xPx + bar.xPx}px, ${system.yPx}px)`,
        width: bar.widthPx,
        height: system.heightPx,
      },
    })),
  )

  const walk = (from: number, key: string): boolean => {
    const at = numbers.indexOf(from)
    const to = key === 'Home' ? 0 : key === 'End' ? numbers.length - 1 : at + (NEXT[key] ?? 0)
    const next = numbers[to]
    if (next === undefined || to === at) return false
    setReached(next)
    nodes.current.get(next)?.focus()
    return true
  }

  return places.map(({ bar, style }) => {
    const label = describeBar(bar, words)
    if (!onPressBar)
      return (
        <View key={bar.number} role="img" aria-label={label} style={[styles.bar, styles.silent, style]} />
      )
    return (
      <Pressable
        key={bar.number}
        ref={(node) => {
          if (node) nodes.current.set(bar.number, node as unknown as Focusable)
          else nodes.current.delete(bar.number)
        }}
        role="button"
        aria-label={label}
        aria-pressed={bar.number === handBar}
        tabIndex={bar.number === stop ? 0 : -1}
        onFocus={() => {
          setReached(bar.number)
          onReachBar?.(bar.number)
        }}
        onPress={() => onPressBar(bar.number)}
        // The web's key event, which the native types leave out.
        {...({
          onKeyDown: (event: { key: string; preventDefault: () => void }) => {
            if (walk(bar.number, event.key)) event.preventDefault()
          },
        } as object)}
        style={[styles.bar, style]}
      />
    )
  })
})

const styles = StyleSheet.create({
  // The ring stays inside, as the score is cut at its edges.
  bar: { position: 'absolute', left: 0, top: 0, outlineOffset: -3 },
  silent: { pointerEvents: 'none' },
})
