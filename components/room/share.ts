import type { BoardState, SheetState } from '@/shared/board'

/** `after`, or `before` itself when each of its parts is the same: what did not change is not drawn again. */
export function shareParts<Parts extends object>(before: Parts, after: Parts): Parts {
  const [old, fresh] = [before as Record<string, unknown>, after as Record<string, unknown>]
  const keys = Object.keys(fresh)
  const isSame = keys.length === Object.keys(old).length && keys.every((key) => old[key] === fresh[key])
  return isSame ? before : after
}

export function shareBoard(before: BoardState | null, after: BoardState | null): BoardState | null {
  if (!before || !after) return after
  return shareParts(before, {
    ...after,
    bars: shareParts(before.bars, after.bars),
    line: shareParts(before.line, after.line),
    gestures: shareParts(before.gestures, after.gestures),
    spread: shareParts(before.spread, after.spread),
  })
}

export const shareSheet = (before: SheetState, after: SheetState): SheetState =>
  shareParts(before, {
    notes: shareParts(before.notes, after.notes),
    marks: shareParts(before.marks, after.marks),
  })
