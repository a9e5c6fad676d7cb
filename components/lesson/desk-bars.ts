import { isSameNotes } from '@/shared/board'
import type { BarNotes } from '@/shared/theory/note'
import type { BarState, SheetBar } from '@/shared/wire/documents'

/**
 * What one bar is to the student whose sheet it is read with.
 * `open`: notes may be proposed; `earlier` is what stood there before the room was cleared, offered again.
 * `closed`: only read; `draft` is what the student wrote that the class did not adopt.
 */
export type DeskBar = Readonly<
  | { kind: 'open'; number: number; notes: BarNotes | null; earlier: BarNotes | null }
  | { kind: 'closed'; number: number; adopted: BarNotes | null; draft: BarNotes | null }
  | { kind: 'set-aside'; number: number; adopted: BarNotes | null }
>

export function readDeskBar(
  number: number,
  state: BarState,
  adopted: BarNotes | null,
  own: SheetBar | null,
): DeskBar {
  if (state.setAside) return { kind: 'set-aside', number, adopted }
  if (state.state === 'frozen') {
    const draft = own && !(adopted && isSameNotes(own.notes, adopted)) ? own.notes : null
    return { kind: 'closed', number, adopted, draft }
  }
  const isCurrent = own !== null && own.round === state.round
  return {
    kind: 'open',
    number,
    notes: isCurrent ? own.notes : null,
    earlier: own && !isCurrent ? own.notes : null,
  }
}

/** The bar to take in hand when the one in hand is no longer open: the nearest open one, the earlier of two. */
export function nearestOpenBar(bars: readonly DeskBar[], from: number): number | null {
  let best: number | null = null
  for (const bar of bars)
    if (bar.kind === 'open' && (best === null || Math.abs(bar.number - from) < Math.abs(best - from)))
      best = bar.number
  return best
}

/** The next bar that may be written, walking one way from a bar; null at the end. Bars set aside are stepped over. */
export function nextReadBar(bars: readonly DeskBar[], from: number, by: 1 | -1): number | null {
  for (let number = from + by; number >= 1 && number <= bars.length; number += by)
    if (bars[number - 1]?.kind !== 'set-aside') return number
  return null
}
