import { RulesPage } from '@/components/rules/rules-page'

export default function RulesRoute() {
  return <RulesPage />
}
