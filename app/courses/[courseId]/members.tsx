import { useLocalSearchParams } from 'expo-router'
import { MembersPage } from '@/components/courses/members-page'
import { SignedIn } from '@/components/session'

export default function MembersRoute() {
  const { courseId } = useLocalSearchParams<{ courseId: string }>()
  return <SignedIn>{(me) => <MembersPage key={courseId} me={me} courseId={courseId} />}</SignedIn>
}
