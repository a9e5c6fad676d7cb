import { useMemo } from 'react'
import type { LessonView } from '@/components/lesson/lesson-view'
import { lineWith } from '@/components/lesson/line-with'
import type { RoomGroup } from '@/components/lesson/room'
import { useWays, type KnownWays } from './use-ways'
import type { WaysQuestion } from './ways-messages'

/** Proposals whose ways are counted, the first in the list first; a teacher does not read further. */
const MOST_ASKED = 24

/** Ways to finish the line as it stands, under the empty key, and with each of the room's proposals in it. */
export function useLecternWays(view: LessonView, groups: readonly RoomGroup[]): KnownWays {
  const questions = useMemo<readonly WaysQuestion[]>(
    () => [
      { key: '', line: view.line },
      ...groups.slice(0, MOST_ASKED).map(({ key, notes }) => ({ key, line: lineWith(view.line, notes) })),
    ],
    [view.line, groups],
  )
  return useWays(view, questions)
}
