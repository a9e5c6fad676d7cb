import { useLocalSearchParams } from 'expo-router'
import { RulePageScreen } from '@/components/rules/rule-page'

export default function RuleRoute() {
  const { ruleId } = useLocalSearchParams<{ ruleId: string }>()
  return <RulePageScreen key={ruleId} ruleId={ruleId} />
}
