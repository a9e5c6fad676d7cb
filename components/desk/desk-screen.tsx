import { Redirect, type Href } from 'expo-router'
import { useCallback, useMemo, useState } from 'react'
import { BoardDoor, ClosedDoor, EntryDoor } from '@/components/lesson/lesson-door'
import { useEntry } from '@/components/lesson/use-entry'
import { useLessonRoom } from '@/components/lesson/use-lesson-room'
import { useWords } from '@/components/words'
import { can, eraseSheetBar, writeSheetBar } from '@/shared/board'
import { Desk } from './desk'
import type { SheetPen } from './use-desk'

/** A student's desk in a lesson: enters, opens the room, and says in words why not. */
export function DeskScreen({ lessonId }: Readonly<{ lessonId: string }>) {
  const words = useWords()
  const { state, reload } = useEntry(lessonId)
  const { room, view, entry } = useLessonRoom(lessonId, state, reload)
  const sheetDoc = room.docs?.sheet ?? null
  const pen = useMemo<SheetPen>(
    () => ({
      write: (bar, notes, round) => {
        if (sheetDoc) writeSheetBar(sheetDoc, bar, notes, round)
      },
      erase: (bar) => {
        if (sheetDoc) eraseSheetBar(sheetDoc, bar)
      },
    }),
    [sheetDoc],
  )
  const hand = useHand(room.send, view.isHandUp)

  if (!entry) return <EntryDoor state={state} onRetry={reload} />
  const { lesson, role } = entry
  if (!can(role, 'propose')) return <Redirect href={`/lessons/${lessonId}/lectern` as Href} />
  if (lesson.status === 'ended' || view.connection === 'closed')
    return (
      <ClosedDoor
        title={lesson.title}
        because={lesson.status === 'ended' ? 'lesson-ended' : view.closedBecause}
        href={role === 'guest' ? '/' : '/home'}
        linkLabel={words.desk.leave}
      />
    )
  if (!view.board) return <BoardDoor title={lesson.title} isUnloadable={room.isUnloadable} />
  return (
    <Desk
      title={lesson.title}
      board={view.board}
      sheet={view.sheet}
      pen={pen}
      kept={view.kept}
      here={view.connection === 'live' && view.presence.here > 0 ? view.presence.here : null}
      isOffline={view.connection === 'offline'}
      hindrance={view.hindrance}
      isPrepared={lesson.status === 'prepared'}
      isHandUp={hand.isUp}
      onHand={hand.turn}
    />
  )
}

/** One's own hand: as the server has it, and as it was just turned until the server has answered. */
function useHand(send: ReturnType<typeof useLessonRoom>['room']['send'], isHandUp: boolean) {
  const [turned, setTurned] = useState<boolean | null>(null)
  const isUp = turned ?? isHandUp
  const turn = useCallback(() => {
    setTurned(!isUp)
    // The server tells the hand before it answers; refused or out of touch, it is as it was.
    void send('hand', { up: !isUp }).then(() => setTurned(null))
  }, [isUp, send])
  return { isUp, turn }
}
