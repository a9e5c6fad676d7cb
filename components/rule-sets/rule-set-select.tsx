import { useState } from 'react'
import { View } from 'react-native'
import { RefusalNotice, useQuery, type Refusal } from '@/components/api'
import { space } from '@/components/theme'
import { Select } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { PRESETS, type RuleSet } from '@/shared/rules'
import { fetchRuleSet } from './fetch-rule-set'

/** Chooses among all rule sets one may use: those offered here, one's own, and those shared with one's courses. */
export function RuleSetSelect({
  label,
  value,
  onChoose,
}: Readonly<{ label: string; value: string; onChoose: (ruleSet: RuleSet) => void }>) {
  const words = useWords().ruleSets
  const kept = useQuery(api.ruleSets.list, {}).data?.ruleSets ?? []
  const [refusal, setRefusal] = useState<Refusal | null>(null)
  const options = [
    ...PRESETS.map(({ id, name }) => ({ value: id, label: name })),
    ...kept.map(({ id, name, isMine }) => ({ value: id, label: words.option(name, isMine) })),
  ]
  // Its list may still be on the way.
  if (!options.some((option) => option.value === value)) options.push({ value, label: words.chosen })
  const choose = async (id: string) => {
    const result = await fetchRuleSet(id)
    setRefusal(result.ok ? null : result.reason)
    if (result.ok) onChoose(result.value.ruleSet)
  }
  return (
    <View style={{ gap: space.small }}>
      <Select label={label} value={value} options={options} onChange={(id) => void choose(id)} />
      <RefusalNotice refusal={refusal} />
    </View>
  )
}
