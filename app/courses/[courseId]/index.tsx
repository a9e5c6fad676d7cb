import { useLocalSearchParams } from 'expo-router'
import { CoursePage } from '@/components/courses/course-page'
import { SignedIn } from '@/components/session'

export default function CourseRoute() {
  const { courseId } = useLocalSearchParams<{ courseId: string }>()
  return <SignedIn>{(me) => <CoursePage key={courseId} me={me} courseId={courseId} />}</SignedIn>
}
