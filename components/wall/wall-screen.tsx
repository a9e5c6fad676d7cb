import { useCallback, useEffect, useMemo, useRef, useState } from 'react'
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

/** How often a wall whose lesson has ended asks whether it was opened again. */
const ASK_AGAIN_MS = 15_000

/**
 * The wall of a lesson. It shows the wall whoever opens it: a teacher's own browser shows no more than the projector's. A
 * lesson that is opened again has a new room, which is entered anew.
 */
export function WallScreen({ lessonId }: Readonly<{ lessonId: string }>) {
  const [turn, setTurn] = useState(0)
  const onReopened = useCallback(() => setTurn((before) => before + 1), [])
  return <WallInLesson key={turn} lessonId={lessonId} onReopened={onReopened} />
}

function WallInLesson({ lessonId, onReopened }: Readonly<{ lessonId: string; onReopened: () => void }>) {
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

  const isOver = view.closedBecause === 'lesson-ended'
  useEffect(() => {
    if (!isOver) return
    const timer = setInterval(reload, ASK_AGAIN_MS)
    return () => clearInterval(timer)
  }, [isOver, reload])
  const status = entry?.lesson.status
  const hasEnded = useRef(false)
  useEffect(() => {
    if (status === 'ended') hasEnded.current = true
    else if (status === 'open' && hasEnded.current) onReopened()
  }, [status, onReopened])

  if (!entry) return <EntryDoor state={state} onRetry={reload} />
  const { lesson, role } = entry
  if (role === 'student' || role === 'guest') return <ClosedDoor title={lesson.title} because="forbidden" />
  // What was built stays on the wall when the lesson is over.
  if (view.connection === 'closed' && !(isOver && view.board))
    return <ClosedDoor title={lesson.title} because={view.closedBecause} />
  if (!view.board) return <BoardDoor title={lesson.title} isUnloadable={room.isUnloadable} />
  return (
    <Wall
      lesson={lesson}
      board={view.board}
      chorus={view.chorus}
      here={view.presence.here}
      names={names}
      notice={view.connection === 'offline' ? words.wall.offline : sound.problem}
      onLetSound={sound.isAllowed || isOver ? null : sound.allow}
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
