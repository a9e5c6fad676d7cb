import { useLocalSearchParams } from 'expo-router'
import { LecternScreen } from '@/components/lectern/lectern-screen'

export default function LecternRoute() {
  const { lessonId } = useLocalSearchParams<{ lessonId: string }>()
  return <LecternScreen key={lessonId} lessonId={lessonId} />
}
