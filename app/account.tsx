import { AccountPage } from '@/components/account/account-page'
import { SignedIn } from '@/components/session'

export default function Account() {
  return <SignedIn>{(me) => <AccountPage me={me} />}</SignedIn>
}
