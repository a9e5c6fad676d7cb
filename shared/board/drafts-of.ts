import type { BarNotes } from '@/shared/theory/note'
import type { BoardState, SheetState } from './board-state'

/** Notes on a sheet that are not before the class: kept, and offered again. */
export type Draft = Readonly<{ bar: number; notes: BarNotes; because: 'frozen' | 'older-round' }>

/**
 * Drafts of a sheet, by bar. A frozen bar takes nothing new: what the sheet holds goes to the class when it is released
 * again. Notes of an older round go only when they are written anew.
 */
export function draftsOf(sheet: SheetState, board: BoardState): readonly Draft[] {
  const drafts: Draft[] = []
  for (const bar of Object.keys(board.bars).map(Number)) {
    const written = sheet.notes[bar]
    const state = board.bars[bar]
    if (!written || !state) continue
    if (written.round !== state.round) drafts.push({ bar, notes: written.notes, because: 'older-round' })
    else if (state.state === 'frozen') drafts.push({ bar, notes: written.notes, because: 'frozen' })
  }
  return drafts
}
