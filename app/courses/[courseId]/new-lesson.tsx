import { useLocalSearchParams } from 'expo-router'
import { SetupScreen } from '@/components/lesson/setup/setup-screen'
import { SignedIn } from '@/components/session'

export default function NewLesson() {
  const { courseId } = useLocalSearchParams<{ courseId: string }>()
  return <SignedIn>{(me) => <SetupScreen key={courseId} me={me} courseId={courseId} />}</SignedIn>
}
