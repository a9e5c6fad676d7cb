export { ACTS, can, type Act, type Role } from './can'
export { stepLesson, type LessonLife, type LessonStep } from './lifecycle'
export {
  barsOf,
  createBoardState,
  INITIAL_BAR,
  INITIAL_STAGE,
  type BoardState,
  type ChorusState,
  type SheetState,
} from './board-state'
export { isGestureSpan, MIN_GESTURE_BARS, readBoard } from './read-board'
export { readSheet } from './read-sheet'
export { formatProposalKey, parseProposalKey, readChorus, updateChorus } from './read-chorus'
export {
  adoptBars,
  clearRoom,
  drawGesture,
  eraseGesture,
  freezeBars,
  releaseBars,
  setBarsAside,
  takeBackBars,
  takeBarsUp,
  updateStage,
  writeBoardState,
} from './write-board'
export { eraseMark, eraseSheetBar, writeMark, writeSheetBar } from './write-sheet'
export { formatNotes, groupProposals, isSameNotes, spreadOf, type ProposalGroup } from './group-proposals'
export { draftsOf, type Draft } from './drafts-of'
export { boardEventSchema, type BoardEvent, type JournalEvent } from './event'
export { deriveBoardEvents } from './derive-events'
export { foldEvents, type RoomState } from './fold-events'
