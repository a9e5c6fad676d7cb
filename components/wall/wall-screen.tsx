import { useCallback, useEffect, useMemo, useState } from 'react'
import { useRoomEvent, type RoomHandle } from '@/components/room'
import { lineWith } from '@/components/lesson/line-with'
import { BoardDoor, ClosedDoor, EntryDoor } from '@/components/lesson/lesson-door'
import { useEntry } from '@/components/lesson/use-entry'
import { useGroundFromAddress } from '@/components/lesson/use-ground-from-address'
import { useLessonRoom } from '@/components/lesson/use-lesson-room'
import { useCuesHere } from '@/components/lesson/wall-cues'
import { usePlayer, useStopOnLeave } from '@/components/sound'
import { useWords } from '@/components/words'
import type { BoardState } from '@/shared/board'
import type { Line } from '@/shared/theory/note'
import type { ChannelEvents } from '@/shared/wire/rooms'
import { Wall } from './wall'

/** The wall of a lesson. It opens as the wall whoever opens it: a teacher's own browser shows no more than the projector's. */
export function WallScreen({ lessonId }: Readonly<{ lessonId: string }>) {
  const words = useWords()
  const { state, reload } = useEntry(lessonId)
  const { room, view, entry } = useLessonRoom(lessonId, state, reload)
  useGroundFromAddress()
  const sound = useCues(lessonId, room, view.board)

  const showsNames = view.board?.stage.showsNames ?? false
  const { members } = view.presence
  const names = useMemo(
    () => (showsNames && members ? new Map(members.map(({ memberId, name }) => [memberId, name])) : null),
    [showsNames, members],
  )

  if (!entry) return <EntryDoor state={state} onRetry={reload} />
  const { lesson, role } = entry
  if (role === 'student' || role === 'guest') return <ClosedDoor title={lesson.title} because="forbidden" />
  if (view.connection === 'closed') return <ClosedDoor title={lesson.title} because={view.closedBecause} />
  if (!view.board) return <BoardDoor title={lesson.title} isUnloadable={room.isUnloadable} />
  return (
    <Wall
      lesson={lesson}
      board={view.board}
      chorus={view.chorus}
      here={view.presence.here}
      names={names}
      notice={view.connection === 'live' ? sound.problem : words.wall.offline}
      onLetSound={sound.isAllowed ? null : sound.allow}
    />
  )
}

/** Plays what the lectern cues. A browser lets a page sound only after a touch, so one is asked for. */
function useCues(lessonId: string, room: RoomHandle, board: BoardState | null) {
  const { play, stop, strike, problem } = usePlayer()
  const [isAllowed, setAllowed] = useState(() => hasBeenTouched())
  useStopOnLeave()
  useEffect(() => {
    if (isAllowed) return
    const onTouch = () => setAllowed(true)
    window.addEventListener('pointerdown', onTouch, { once: true })
    window.addEventListener('keydown', onTouch, { once: true })
    return () => {
      window.removeEventListener('pointerdown', onTouch)
      window.removeEventListener('keydown', onTouch)
    }
  }, [isAllowed])
  const onCue = useCallback<ChannelEvents['cue']>(
    (cue) => {
      if (cue.kind === 'stop' || !board) return stop()
      const { proposal, voices, fromBar, toBar, tempo } = cue
      play({
        id: 'cue',
        score: {
          cantus: board.exercise.cantus,
          line: proposal ? lineWith(board.line, proposal as unknown as Line) : board.line,
          setAside: Object.entries(board.bars).flatMap(([bar, { setAside }]) =>
            setAside ? [Number(bar)] : [],
          ),
        },
        voices,
        fromBar,
        toBar,
        tempo,
      })
    },
    [board, play, stop],
  )
  useRoomEvent(room, 'cue', onCue)
  useCuesHere(lessonId, onCue)
  const allow = useCallback(() => {
    setAllowed(true)
    // One quiet note, so that the volume can be set before the class hears any.
    strike('A4')
  }, [strike])
  return { problem, isAllowed, allow }
}

const hasBeenTouched = (): boolean =>
  typeof navigator !== 'undefined' &&
  (navigator as { userActivation?: { hasBeenActive: boolean } }).userActivation?.hasBeenActive === true
