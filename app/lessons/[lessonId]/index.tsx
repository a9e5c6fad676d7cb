import { Redirect, useLocalSearchParams, type Href } from 'expo-router'
import { EntryDoor } from '@/components/lesson/lesson-door'
import { useEntry } from '@/components/lesson/use-entry'
import type { LessonRole } from '@/shared/api/lessons'

const FACE_OF_ROLE: Readonly<Record<LessonRole, 'lectern' | 'wall' | 'desk'>> = {
  teacher: 'lectern',
  assistant: 'lectern',
  student: 'desk',
  guest: 'desk',
  wall: 'wall',
}

/** Sends everyone to their own face of the lesson. */
export default function LessonRoute() {
  const { lessonId } = useLocalSearchParams<{ lessonId: string }>()
  const { state, reload } = useEntry(lessonId)
  if (state.status !== 'in') return <EntryDoor state={state} onRetry={reload} />
  return <Redirect href={`/lessons/${lessonId}/${FACE_OF_ROLE[state.entry.role]}` as Href} />
}
