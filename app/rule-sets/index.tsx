import { RuleSetList } from '@/components/rule-sets/rule-set-list'
import { SignedIn } from '@/components/session'

export default function RuleSetsRoute() {
  return <SignedIn>{(me) => <RuleSetList me={me} />}</SignedIn>
}
