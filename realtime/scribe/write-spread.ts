import type * as Y from 'yjs'
import { spreadOf, type BoardState, type ChorusState } from '@/shared/board'

/** Brings the board's anonymous spread up to date in some bars; takes all of it away when the stage hides it. */
export function writeSpread(
  doc: Y.Doc,
  board: BoardState,
  chorus: ChorusState,
  bars: Iterable<number>,
): void {
  const spread = doc.getMap<unknown>('spread')
  if (!board.stage.showsSpread) {
    for (const key of [...spread.keys()]) spread.delete(key)
    return
  }
  for (const bar of bars) {
    const state = board.bars[bar]
    const groups = state ? spreadOf(chorus, bar, state) : []
    const key = String(bar)
    if (groups.length === 0) spread.delete(key)
    else if (JSON.stringify(spread.get(key)) !== JSON.stringify(groups)) spread.set(key, groups)
  }
}
