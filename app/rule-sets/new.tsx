import { useLocalSearchParams } from 'expo-router'
import { NewRuleSetPage } from '@/components/rule-sets/rule-set-page'
import { SignedIn } from '@/components/session'

const USUAL = 'open-undergrad'

export default function NewRuleSetRoute() {
  const { from } = useLocalSearchParams<{ from?: string }>()
  return <SignedIn>{(me) => <NewRuleSetPage key={from} me={me} fromId={from ?? USUAL} />}</SignedIn>
}
