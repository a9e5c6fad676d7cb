import { useLocalSearchParams } from 'expo-router'
import { InvitationPage } from '@/components/courses/invitation-page'

export default function InvitationRoute() {
  const { token } = useLocalSearchParams<{ token: string }>()
  return <InvitationPage token={token} />
}
