import { createBoardState, INITIAL_BAR, type BoardState, type ChorusState } from './board-state'
import type { BoardEvent } from './event'
import { spreadOf } from './group-proposals'

/** What the room could see at a moment: the board and every standing proposal. */
export type RoomState = Readonly<{ board: BoardState; chorus: ChorusState }>

/** The room after all the events, or null before the board was laid. */
export function foldEvents(events: Iterable<BoardEvent>, from: RoomState | null = null): RoomState | null {
  let room = from
  for (const event of events) room = stepRoom(room, event)
  return room && { ...room, board: { ...room.board, spread: spreadsOf(room) } }
}

function spreadsOf({ board, chorus }: RoomState): BoardState['spread'] {
  if (!board.stage.showsSpread) return {}
  return Object.fromEntries(
    Object.entries(board.bars)
      .map(([bar, state]) => [bar, spreadOf(chorus, Number(bar), state)] as const)
      .filter(([, spread]) => spread.length > 0),
  )
}

function stepRoom(room: RoomState | null, event: BoardEvent): RoomState | null {
  if (event.kind === 'board-laid') {
    return { board: createBoardState(event.exercise, event.stage), chorus: room?.chorus ?? {} }
  }
  if (!room) return null
  switch (event.kind) {
    case 'proposal-placed': {
      const { bar, memberId, notes, round } = event
      const bars = { ...room.chorus[bar], [memberId]: { notes, round } }
      return { ...room, chorus: { ...room.chorus, [bar]: bars } }
    }
    case 'proposal-erased':
      return {
        ...room,
        chorus: keepProposals(room.chorus, event.bar, (memberId) => memberId !== event.memberId),
      }
    case 'room-cleared': {
      const isNow = (_: string, round: number) => round === event.round
      return {
        board: stepBoard(room.board, event),
        chorus: keepProposals(room.chorus, event.bar, isNow),
      }
    }
    default:
      return { ...room, board: stepBoard(room.board, event) }
  }
}

/** The chorus with only those proposals of a bar that pass; a bar without any is left out. */
function keepProposals(
  chorus: ChorusState,
  bar: number,
  passes: (memberId: string, round: number) => boolean,
): ChorusState {
  const { [bar]: there = {}, ...others } = chorus
  const kept = Object.entries(there).filter(([memberId, { round }]) => passes(memberId, round))
  return kept.length > 0 ? { ...others, [bar]: Object.fromEntries(kept) } : others
}

function without<Value>(record: Readonly<Record<string, Value>>, key: string | number) {
  const { [key]: _, ...rest } = record
  return rest
}

type BoardOnlyEvent = Exclude<
  BoardEvent,
  { kind: 'board-laid' } | { kind: 'proposal-placed' } | { kind: 'proposal-erased' }
>

function stepBoard(board: BoardState, event: BoardOnlyEvent): BoardState {
  const withBar = (bar: number, patch: Partial<BoardState['bars'][number]>): BoardState => ({
    ...board,
    bars: { ...board.bars, [bar]: { ...(board.bars[bar] ?? INITIAL_BAR), ...patch } },
  })
  switch (event.kind) {
    case 'exercise-changed':
      return changeExercise(board, event.exercise)
    case 'stage-changed':
      return { ...board, stage: event.stage }
    case 'bar-released':
      return withBar(event.bar, { state: 'released' })
    case 'bar-frozen':
      return withBar(event.bar, { state: 'frozen' })
    case 'bar-set-aside':
      return withBar(event.bar, { setAside: true })
    case 'bar-taken-up':
      return withBar(event.bar, { setAside: false })
    case 'room-cleared':
      return withBar(event.bar, { round: event.round })
    case 'adopted':
      return { ...board, line: { ...board.line, [event.bar]: event.notes } }
    case 'taken-back':
      return { ...board, line: without(board.line, event.bar) }
    case 'gesture-drawn':
      return { ...board, gestures: { ...board.gestures, [event.id]: event.gesture } }
    case 'gesture-erased':
      return { ...board, gestures: without(board.gestures, event.id) }
  }
}

/** Another exercise on the same board: bars that the new cantus does not have are gone. */
function changeExercise(board: BoardState, exercise: BoardState['exercise']): BoardState {
  const fresh = createBoardState(exercise, board.stage)
  const has = (bar: string) => fresh.bars[Number(bar)] !== undefined
  const kept = <Value>(values: Readonly<Record<number, Value>>) =>
    Object.fromEntries(Object.entries(values).filter(([bar]) => has(bar)))
  return { ...board, exercise, bars: { ...fresh.bars, ...kept(board.bars) }, line: kept(board.line) }
}
