import { useLocalSearchParams } from 'expo-router'
import { JoinScreen } from '@/components/join/join-screen'

/** Where the square on the wall leads: the code is in the address. */
export default function JoinByCode() {
  const { code } = useLocalSearchParams<{ code: string }>()
  return <JoinScreen code={code} />
}
