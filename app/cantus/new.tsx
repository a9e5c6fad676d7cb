import { useLocalSearchParams } from 'expo-router'
import { NewCantusPage } from '@/components/cantus/cantus-page'
import { SignedIn } from '@/components/session'

export default function NewCantusRoute() {
  const { from } = useLocalSearchParams<{ from?: string }>()
  return <SignedIn>{(me) => <NewCantusPage me={me} fromId={from ?? null} />}</SignedIn>
}
