import type { BoardState, ChorusState, SheetState } from '@/shared/board'
import { CLOSE, type PresentMember } from '@/shared/wire/rooms'

/** Why a room is closed for good on this screen: one of the wire's reasons. */
export type ClosedReason = (typeof CLOSE)[keyof typeof CLOSE]['reason']

/** Everything a screen knows of a live lesson. Parts that did not change keep their identity. */
export type RoomView = Readonly<{
  /** Null until it has arrived. */
  board: BoardState | null
  /** One's own; empty for those who have none. */
  sheet: SheetState
  /** Empty for those who may not see it. */
  chorus: ChorusState
  presence: Readonly<{ here: number; hands: number; members: readonly PresentMember[] | null }>
  /** Whether one's own hand is up, as the server has it: a teacher may lower it. */
  isHandUp: boolean
  /** `connecting`: never been in. `offline`: was in, and is trying to come back. `closed`: will not come back by itself. */
  connection: 'connecting' | 'live' | 'offline' | 'closed'
  closedBecause: ClosedReason | null
  /** Of what was written on this screen: in the journal, on its way there, or held here until it can go. */
  kept: 'kept' | 'sending' | 'waiting'
  /** What hinders the school's server from keeping anything just now. */
  hindrance: 'database' | 'disk-full' | null
}>

export const EMPTY_VIEW: RoomView = {
  board: null,
  sheet: { notes: {}, marks: [] },
  chorus: {},
  presence: { here: 0, hands: 0, members: null },
  isHandUp: false,
  connection: 'connecting',
  closedBecause: null,
  kept: 'kept',
  hindrance: null,
}

/** The wire's reason for a close code; null for a code that is not ours. */
export const closedReasonOf = (code: number): ClosedReason | null =>
  Object.values(CLOSE).find((closing) => closing.code === code)?.reason ?? null
