import { isSameNotes, type BoardState, type ChorusState } from '@/shared/board'
import type { ChorusProposal, SheetBar } from '@/shared/wire/documents'

/** What the scribe is to do to the chorus. */
export type Carried = Readonly<{
  place: readonly Readonly<{ bar: number; memberId: string; proposal: ChorusProposal }>[]
  /** `isOver`: of an older round, and so gone with the clearing of the room rather than by the member's own hand. */
  erase: readonly Readonly<{ bar: number; memberId: string; isOver: boolean }>[]
}>

/** What a member's sheet holds in a bar. */
export type ReadSheetBar = (memberId: string, bar: number) => SheetBar | null

/** Bars whose proposals must be looked at again for every member: released since, or in another round. */
function barsToRevisit(before: BoardState | null, board: BoardState): readonly number[] {
  return Object.keys(board.bars)
    .map(Number)
    .filter((bar) => {
      const now = board.bars[bar] as BoardState['bars'][number]
      const then = before?.bars[bar]
      return !then || then.round !== now.round || (now.state === 'released' && then.state === 'frozen')
    })
}

/**
 * Carries what stands on the sheets into the chorus: only in released bars, only of the bar's present round, whole
 * values that parse. A frozen bar keeps what stood in it. Pure, and the same however often it is asked.
 */
export function carryProposals({
  before,
  board,
  chorus,
  changed,
  members,
  readBar,
}: Readonly<{
  before: BoardState | null
  board: BoardState
  chorus: ChorusState
  /** Bars written on since the last beat, by member. */
  changed: ReadonlyMap<string, ReadonlySet<number>>
  /** Everyone who has a sheet and was not removed. */
  members: Iterable<string>
  readBar: ReadSheetBar
}>): Carried {
  const place: { bar: number; memberId: string; proposal: ChorusProposal }[] = []
  const erase: { bar: number; memberId: string; isOver: boolean }[] = []
  const carry = (bar: number, memberId: string) => {
    const state = board.bars[bar]
    if (!state) return
    const there = chorus[bar]?.[memberId]
    const isOver = there !== undefined && there.round !== state.round
    const standing = isOver ? undefined : there
    const written = state.state === 'released' ? readBar(memberId, bar) : null
    const notes = written?.round === state.round ? written.notes : null
    if (notes) {
      if (!standing || !isSameNotes(notes, standing.notes)) {
        place.push({ bar, memberId, proposal: { notes, round: state.round } })
      }
    } else if (isOver) erase.push({ bar, memberId, isOver })
    else if (standing && state.state === 'released') erase.push({ bar, memberId, isOver })
  }
  const revisited = new Set(barsToRevisit(before, board))
  const everyone = revisited.size > 0 ? [...members] : []
  for (const bar of revisited) {
    for (const memberId of new Set([...everyone, ...Object.keys(chorus[bar] ?? {})])) carry(bar, memberId)
  }
  for (const [memberId, bars] of changed) {
    for (const bar of bars) if (!revisited.has(bar)) carry(bar, memberId)
  }
  return { place, erase }
}
