import { CantusLibrary } from '@/components/cantus/cantus-library'
import { SignedIn } from '@/components/session'

export default function CantusRoute() {
  return <SignedIn>{(me) => <CantusLibrary me={me} />}</SignedIn>
}
