import { useEffect, useMemo, useRef, useState } from 'react'
import { View } from 'react-native'
import { moveSelection, selectedBars, type Selection, type SelectionMove } from '@/components/lesson/bars'
import { PlayingScore } from '@/components/lesson/playing-score'
import { describeBar, type Highlight } from '@/components/score'
import { RULE_PX, useTheme } from '@/components/theme'
import { useWords } from '@/components/words'
import { barAt } from '@/shared/notation/hit-test'
import { layoutScore } from '@/shared/notation/layout-score'
import type { ScoreInput } from '@/shared/notation/score-input'
import type { BarLayout, SystemLayout } from '@/shared/notation/score-layout'

type Props = Readonly<{
  input: ScoreInput
  width: number
  maxHeight: number | undefined
  selection: Selection
  onSelect: (selection: Selection) => void
  highlight: Highlight | null
  label: string
}>

const KEYS: Readonly<Record<string, (isExtending: boolean) => SelectionMove>> = {
  ArrowRight: (isExtending) => ({ kind: 'step', by: 1, isExtending }),
  ArrowLeft: (isExtending) => ({ kind: 'step', by: -1, isExtending }),
  Home: (isExtending) => ({ kind: 'end', of: 'first', isExtending }),
  End: (isExtending) => ({ kind: 'end', of: 'last', isExtending }),
  Escape: () => ({ kind: 'none' }),
}

/** A score whose bars are selected: a click for one, a drag or shift for a span, the arrows from a keyboard. */
export function SelectableScore({ input, width, maxHeight, selection, onSelect, highlight, label }: Props) {
  const words = useWords()
  const { colors } = useTheme()
  const widthPx = Math.floor(width)
  const layout = useMemo(
    () => layoutScore(input, { size: 'page', widthPx, maxHeightPx: maxHeight }),
    [input, widthPx, maxHeight],
  )
  const barCount = input.bars.length
  const selected = selectedBars(selection)
  const dragFrom = useRef<number | null>(null)
  const hasDragged = useRef(false)
  const options = useRef(new Map<number, HTMLDivElement>())
  const [isKeyed, setKeyed] = useState(false)
  const head = selection?.head ?? null

  useEffect(() => {
    if (isKeyed && head !== null) options.current.get(head)?.focus()
  }, [isKeyed, head])

  const barUnder = (event: React.PointerEvent): number | null => {
    const box = event.currentTarget.getBoundingClientRect()
    return barAt(layout, event.clientX - box.left, event.clientY - box.top)?.bar.number ?? null
  }
  const move = (step: SelectionMove) => onSelect(moveSelection(selection, step, barCount))

  const places = layout.systems.flatMap((system) => system.bars.map((bar) => ({ system, bar })))
  return (
    <div
      role="listbox"
      aria-label={label}
      aria-multiselectable
      aria-orientation="horizontal"
      style={{
        position: 'relative',
        width: widthPx,
        height: layout.heightPx,
        touchAction: 'pan-y',
        cursor: 'pointer',
      }}
      onPointerDown={(event) => {
        if (event.button !== 0) return
        setKeyed(false)
        hasDragged.current = false
        dragFrom.current = barUnder(event)
      }}
      onPointerMove={(event) => {
        const from = dragFrom.current
        const at = from === null ? null : barUnder(event)
        if (from === null || at === null || (at === from && !hasDragged.current)) return
        if (!hasDragged.current) event.currentTarget.setPointerCapture(event.pointerId)
        hasDragged.current = true
        if (selection?.anchor !== from || selection.head !== at) onSelect({ anchor: from, head: at })
      }}
      onPointerUp={(event) => {
        const bar = barUnder(event)
        const isClick = dragFrom.current !== null && !hasDragged.current
        dragFrom.current = null
        if (isClick)
          move(bar === null ? { kind: 'none' } : { kind: 'press', bar, isExtending: event.shiftKey })
      }}
      onPointerCancel={() => {
        dragFrom.current = null
      }}
      onKeyDown={(event) => {
        if (event.altKey) return
        const isAll = event.key === 'a' && (event.ctrlKey || event.metaKey)
        const step = isAll ? ({ kind: 'all' } as const) : KEYS[event.key]?.(event.shiftKey)
        if (!step || (!isAll && (event.ctrlKey || event.metaKey))) return
        event.preventDefault()
        setKeyed(true)
        move(step)
      }}
    >
      {places
        .filter(({ bar }) => selected.includes(bar.number))
        .map(({ system, bar }) => (
          <div
            key={bar.number}
            style={{
              ...boxOf(system, bar),
              background: colors.leaf,
              boxShadow: `inset 0 -${2 * RULE_PX}px 0 ${colors.azurite}`,
            }}
          />
        ))}
      <View aria-hidden style={{ position: 'relative' }}>
        <PlayingScore input={input} size="page" width={widthPx} maxHeight={maxHeight} highlight={highlight} />
      </View>
      {places.map(({ system, bar }) => {
        const isStop = bar.number === (head ?? 1)
        const data = input.bars[bar.index]
        return (
          <div
            key={bar.number}
            ref={(element) => {
              if (element) options.current.set(bar.number, element)
              else options.current.delete(bar.number)
            }}
            role="option"
            aria-selected={selected.includes(bar.number)}
            aria-label={data ? describeBar(data, words) : String(bar.number)}
            tabIndex={isStop ? 0 : -1}
            style={{ ...boxOf(system, bar), outlineOffset: -2 }}
          />
        )
      })}
    </div>
  )
}

const boxOf = (system: SystemLayout, bar: BarLayout) =>
  ({
    position: 'absolute',
    left: 0,
    top: 0,
    transform: `translate(${system.xPx + bar.xPx}px, ${system.yPx}px)`,
    width: bar.widthPx,
    height: system.heightPx,
  }) as const
