/** Bar numbers as the lesson speaks of them: 1-based, ascending, without doubles. */
export type Bars = readonly number[]

/** Every bar from one end to the other, whichever is given first. */
export const barsBetween = (a: number, b: number): Bars =>
  Array.from({ length: Math.abs(a - b) + 1 }, (_, index) => Math.min(a, b) + index)

/** Splits bars into runs of neighbours: `[1, 2, 3, 6]` is `[[1, 2, 3], [6]]`. */
export function runsOf(bars: Bars): readonly Bars[] {
  const runs: number[][] = []
  for (const bar of bars) {
    const last = runs.at(-1)
    if (last && last.at(-1) === bar - 1) last.push(bar)
    else runs.push([bar])
  }
  return runs
}

/** What is selected on the lectern: the bar that stays, and the end that moves with shift, a drag or the arrow keys. */
export type Selection = Readonly<{ anchor: number; head: number }> | null

export const selectedBars = (selection: Selection): Bars =>
  selection ? barsBetween(selection.anchor, selection.head) : []

export type SelectionMove = Readonly<
  | { kind: 'press'; bar: number; isExtending: boolean }
  | { kind: 'step'; by: number; isExtending: boolean }
  | { kind: 'end'; of: 'first' | 'last'; isExtending: boolean }
  | { kind: 'all' }
  | { kind: 'none' }
>

/** The selection after a press or a key. Pressing the one selected bar again selects nothing. */
export function moveSelection(selection: Selection, move: SelectionMove, barCount: number): Selection {
  if (move.kind === 'none') return null
  if (move.kind === 'all') return { anchor: 1, head: barCount }
  if (move.kind === 'press') {
    if (move.isExtending && selection) return { anchor: selection.anchor, head: move.bar }
    const isOnly = selection?.anchor === move.bar && selection.head === move.bar
    return isOnly ? null : { anchor: move.bar, head: move.bar }
  }
  const from = selection?.head ?? (move.kind === 'step' && move.by < 0 ? barCount + 1 : 0)
  const target = move.kind === 'end' ? (move.of === 'first' ? 1 : barCount) : from + move.by
  const head = Math.min(barCount, Math.max(1, target))
  return { anchor: move.isExtending && selection ? selection.anchor : head, head }
}
