import { PeoplePage } from '@/components/people/people-page'
import { SignedIn } from '@/components/session'

export default function People() {
  return <SignedIn>{(me) => <PeoplePage me={me} />}</SignedIn>
}
