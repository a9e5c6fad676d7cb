import { useCallback, useMemo } from 'react'
import {
  useRoomEvent,
  useRoomHandle,
  useRoomPart,
  type RoomHandle,
  type RoomView,
  type Who,
} from '@/components/room'
import type { ChannelEvents } from '@/shared/wire/rooms'
import type { Entry, EntryState } from './use-entry'

const whole = (view: RoomView) => view

/** The live room of an entered lesson; when the lesson changes outside its documents, the entry is asked again. */
export function useLessonRoom(
  lessonId: string,
  state: EntryState,
  reload: () => void,
): Readonly<{ room: RoomHandle; view: RoomView; entry: Entry | null }> {
  const entry = state.status === 'in' ? state.entry : null
  const role = entry?.role
  const memberId = entry?.memberId ?? null
  const who = useMemo<Who | null>(() => (role ? { role, memberId } : null), [role, memberId])
  const room = useRoomHandle(lessonId, who)
  const view = useRoomPart(room, whole)
  const onLesson = useCallback<ChannelEvents['lesson']>(() => reload(), [reload])
  useRoomEvent(room, 'lesson', onLesson)
  return { room, view, entry }
}
