import { useDeferredValue, useMemo } from 'react'
import { View } from 'react-native'
import { Notice, Txt } from '@/components/ui'
import { useWords, type Words } from '@/components/words'
import { findConflicts, type Conflict } from '@/shared/rule-sets/find-conflicts'
import { findRule, type RuleId, type RuleSet } from '@/shared/rules'
import { inWords } from './params-fields'

const titleOf = (ruleId: RuleId): string => findRule(ruleId)?.explain.title ?? ruleId

function conflictInWords(conflict: Conflict, { ruleSets: { conflicts } }: Words): string {
  switch (conflict.kind) {
    case 'crossed-bounds':
      return conflicts['crossed-bounds'](
        titleOf(conflict.ruleId),
        inWords(conflict.low),
        inWords(conflict.high),
      )
    case 'nothing-allowed':
      return conflicts['nothing-allowed'](titleOf(conflict.ruleId))
    case 'no-line':
      return conflicts['no-line'](conflict.position, conflict.bar, conflict.rules.map(titleOf))
  }
}

/** What a draft contradicts itself in; a moment behind the draft while it is being changed. */
export function useConflicts(rules: RuleSet['rules']): readonly Conflict[] {
  const steady = useDeferredValue(rules)
  return useMemo(() => findConflicts({ id: 'draft', name: 'draft', rules: steady }), [steady])
}

/** Whether a rule set can be kept by a class at all. */
export function ConflictNotice({ conflicts }: Readonly<{ conflicts: readonly Conflict[] }>) {
  const words = useWords()
  const say = words.ruleSets.conflicts
  if (conflicts.length === 0) return <Notice kind="good" title={say.sound} />
  return (
    <Notice kind="note" title={say.title}>
      <View>
        <Txt kind="note" tone="lead">
          {say.lead}
        </Txt>
        {conflicts.map((conflict, index) => (
          <Txt key={index}>{conflictInWords(conflict, words)}</Txt>
        ))}
      </View>
    </Notice>
  )
}
