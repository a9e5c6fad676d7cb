import { useLocalSearchParams } from 'expo-router'
import { CantusPage } from '@/components/cantus/cantus-page'
import { SignedIn } from '@/components/session'

export default function OneCantusRoute() {
  const { cantusId, change } = useLocalSearchParams<{ cantusId: string; change?: string }>()
  return (
    <SignedIn>
      {(me) => <CantusPage key={cantusId} me={me} cantusId={cantusId} isChanging={change !== undefined} />}
    </SignedIn>
  )
}
