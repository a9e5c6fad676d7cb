import { useLocalSearchParams } from 'expo-router'
import { WallLinkScreen } from '@/components/wall/wall-link-screen'

export default function WallLink() {
  const { token } = useLocalSearchParams<{ token: string }>()
  return <WallLinkScreen token={token} />
}
