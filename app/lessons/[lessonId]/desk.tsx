import { useLocalSearchParams } from 'expo-router'
import { DeskScreen } from '@/components/desk/desk-screen'

export default function DeskRoute() {
  const { lessonId } = useLocalSearchParams<{ lessonId: string }>()
  return <DeskScreen key={lessonId} lessonId={lessonId} />
}
