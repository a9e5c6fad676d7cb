export type { Who } from './live-room'
export { EMPTY_VIEW, type ClosedReason, type RoomView } from './room-view'
export { useRoom, useRoomEvent, useRoomHandle, useRoomPart, type RoomHandle } from './use-room'
