import { nearestOpenBar, readDeskBar, type DeskBar } from '@/components/lesson/desk-bars'
import type { Judge } from '@/components/lesson/judge'
import type { LessonView } from '@/components/lesson/lesson-view'
import type { SheetState } from '@/shared/board'
import type { Finding } from '@/shared/rules'
import type { BarNotes, Line } from '@/shared/theory/note'

/** The student's part of a lesson: every bar as it is to them, and the notes that stand before the class. */
export type DeskReading = Readonly<{
  bars: readonly DeskBar[]
  /** Own notes in open bars. */
  own: Line
  /** Findings on them; null while the teacher keeps findings back. */
  findings: readonly Finding[] | null
}>

/** `unfinished` is what of a bar is written on this device only, to the first gap. */
export function readDesk(
  view: LessonView,
  sheet: SheetState,
  judge: Judge,
  unfinished: Line = {},
): DeskReading {
  const bars = view.exercise.cantus.map((_, index): DeskBar => {
    const number = index + 1
    const state = view.bars[number] ?? { state: 'frozen', setAside: false, round: 1 }
    return readDeskBar(number, state, view.line[number] ?? null, sheet.notes[number] ?? null)
  })
  const own: Record<number, BarNotes> = {}
  for (const bar of bars) {
    const notes = bar.kind === 'open' ? (bar.notes ?? unfinished[bar.number]) : undefined
    if (notes) own[bar.number] = notes
  }
  return { bars, own, findings: view.stage.showsFindings ? judge.ofNotes(own) : null }
}

/**
 * The bar to hold: the one the student chose while it is read at all, else the nearest open one, and where none is open the
 * first that is read.
 */
export function barInHand(bars: readonly DeskBar[], chosen: number | null): number {
  const kind = chosen === null ? undefined : bars[chosen - 1]?.kind
  if (chosen !== null && kind !== undefined && kind !== 'set-aside') return chosen
  return nearestOpenBar(bars, chosen ?? 1) ?? bars.find(({ kind: each }) => each !== 'set-aside')?.number ?? 1
}

/** Findings that speak of a bar, those that end there first. */
export const findingsAt = (findings: readonly Finding[], bar: number): readonly Finding[] =>
  findings
    .filter(({ bars }) => bars.includes(bar))
    .sort((a, b) => Number(b.bars.at(-1) === bar) - Number(a.bars.at(-1) === bar))
