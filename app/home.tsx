import { HomePage } from '@/components/courses/home-page'
import { SignedIn } from '@/components/session'

export default function Home() {
  return <SignedIn>{(me) => <HomePage me={me} />}</SignedIn>
}
