import { useLocalSearchParams } from 'expo-router'
import { WallScreen } from '@/components/wall/wall-screen'

export default function WallRoute() {
  const { lessonId } = useLocalSearchParams<{ lessonId: string }>()
  return <WallScreen key={lessonId} lessonId={lessonId} />
}
