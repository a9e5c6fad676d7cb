import { Redirect, type Href } from 'expo-router'
import { useCallback, useMemo, useState } from 'react'
import { useQuery } from '@/components/api'
import { BoardDoor, ClosedDoor, EntryDoor } from '@/components/lesson/lesson-door'
import { useEntry } from '@/components/lesson/use-entry'
import { useLessonRoom } from '@/components/lesson/use-lesson-room'
import { tellWallsHere } from '@/components/lesson/wall-cues'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { can } from '@/shared/board'
import { createLecternPen } from './lectern-pen'
import { Lectern, type LecternPen } from './lectern'
import type { WallCue } from './use-hearing'

const IDLE: LecternPen = { act: () => {}, adopt: () => {}, undoAdopt: () => {}, stage: () => {} }

/** The lectern of a lesson. A lesson that is opened again has a new room, which is entered anew. */
export function LecternScreen({ lessonId }: Readonly<{ lessonId: string }>) {
  const [turn, setTurn] = useState(0)
  const onReopened = useCallback(() => setTurn((before) => before + 1), [])
  return <LecternInLesson key={turn} lessonId={lessonId} onReopened={onReopened} />
}

/** Enters, opens the room, and says in words why not. */
function LecternInLesson({ lessonId, onReopened }: Readonly<{ lessonId: string; onReopened: () => void }>) {
  const words = useWords()
  const { state, reload, setLesson } = useEntry(lessonId)
  const { room, view, entry } = useLessonRoom(lessonId, state, reload)
  const isLeader = entry !== null && can(entry.role, 'write board')
  const roster = useQuery(api.lessons.roster, { params: { lessonId } }, { isOff: !isLeader })

  const boardDoc = room.docs?.board ?? null
  const pen = useMemo(() => (boardDoc ? createLecternPen(boardDoc) : IDLE), [boardDoc])
  const { members } = view.presence
  const names = useMemo(
    () =>
      new Map([
        ...(roster.data?.members ?? []).map(({ memberId, name }) => [memberId, name] as const),
        ...(members ?? []).map(({ memberId, name }) => [memberId, name] as const),
      ]),
    [roster.data, members],
  )
  const { send } = room
  const lower = useCallback((memberId: string) => void send('lowerHand', { memberId }), [send])
  const remove = useCallback((memberId: string) => void send('remove', { memberId }), [send])
  const cue = useCallback(
    (wallCue: WallCue) => {
      void send('cue', wallCue)
      tellWallsHere(lessonId, wallCue)
    },
    [send, lessonId],
  )
  const people = useMemo(
    () => members?.filter(({ role }) => role === 'student' || role === 'guest') ?? null,
    [members],
  )

  if (!entry) return <EntryDoor state={state} onRetry={reload} />
  const { lesson, role } = entry
  if (role === 'student' || role === 'guest') return <Redirect href={`/lessons/${lessonId}/desk` as Href} />
  if (role === 'wall') return <Redirect href={`/lessons/${lessonId}/wall` as Href} />
  if (view.connection === 'closed' && view.closedBecause !== 'lesson-ended')
    return (
      <ClosedDoor
        title={lesson.title}
        because={view.closedBecause}
        href={`/courses/${lesson.courseId}`}
        linkLabel={words.lectern.back}
      />
    )
  if (!view.board) return <BoardDoor title={lesson.title} isUnloadable={room.isUnloadable} />
  return (
    <Lectern
      lesson={lesson}
      board={view.board}
      chorus={view.chorus}
      here={view.presence.here}
      hands={view.presence.hands}
      people={people}
      names={names}
      isOffline={view.connection === 'offline' && lesson.status !== 'ended'}
      hindrance={view.hindrance}
      pen={pen}
      onLesson={(changed) =>
        lesson.status === 'ended' && changed.status === 'open' ? onReopened() : setLesson(changed)
      }
      onLower={lower}
      onRemove={remove}
      onCue={cue}
    />
  )
}
