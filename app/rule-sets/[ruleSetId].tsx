import { useLocalSearchParams } from 'expo-router'
import { RuleSetPage } from '@/components/rule-sets/rule-set-page'
import { SignedIn } from '@/components/session'

export default function RuleSetRoute() {
  const { ruleSetId } = useLocalSearchParams<{ ruleSetId: string }>()
  return <SignedIn>{(me) => <RuleSetPage key={ruleSetId} me={me} ruleSetId={ruleSetId} />}</SignedIn>
}
