import { useRouter } from 'expo-router'
import { View } from 'react-native'
import { Asked } from '@/components/api'
import { paramsInWords } from '@/components/rules/param-words'
import { Frame } from '@/components/session'
import { space, useWidth } from '@/components/theme'
import { Button, Empty, LinkText, Lozenge, Table, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Me } from '@/shared/api/people'
import { compareRuleSets, type RuleDifference } from '@/shared/rule-sets/compare-rule-sets'
import { findRule, RULES, type RuleSet } from '@/shared/rules'
import { RuleSetSelect } from './rule-set-select'
import { useRuleSet } from './use-rule-set'

/** Two rule sets side by side: only the rules that differ. */
export function ComparePage({ me, ids }: Readonly<{ me: Me; ids: readonly [a: string, b: string] }>) {
  const say = useWords().ruleSets
  const router = useRouter()
  const { isWide } = useWidth()
  const [a, b] = ids
  const one = useRuleSet(a)
  const other = useRuleSet(b)
  const go = (first: string, second: string) => router.setParams({ a: first, b: second })
  return (
    <Frame me={me} title={say.compared.title} up={{ href: '/rule-sets', label: say.up }}>
      <View
        style={{
          flexDirection: isWide ? 'row' : 'column',
          gap: space.one,
          alignItems: isWide ? 'flex-end' : 'stretch',
          maxWidth: 980,
        }}
      >
        <View style={{ flex: isWide ? 1 : undefined }}>
          <RuleSetSelect label={say.compared.first} value={a} onChoose={({ id }) => go(id, b)} />
        </View>
        <View style={{ flex: isWide ? 1 : undefined }}>
          <RuleSetSelect label={say.compared.second} value={b} onChoose={({ id }) => go(a, id)} />
        </View>
        <View>
          <Button label={say.compared.swap} onPress={() => go(b, a)} />
        </View>
      </View>
      <Asked query={one} lines={6}>
        {({ ruleSet: first }) => (
          <Asked query={other} lines={6}>
            {({ ruleSet: second }) => <Differences sets={[first, second]} />}
          </Asked>
        )}
      </Asked>
    </Frame>
  )
}

function Differences({ sets }: Readonly<{ sets: readonly [RuleSet, RuleSet] }>) {
  const say = useWords().ruleSets.compared
  const rows = compareRuleSets(...sets)
  if (rows.length === 0) return <Empty title={say.same}>{say.sameMore}</Empty>
  return (
    <View style={{ gap: space.half, maxWidth: 1240 }}>
      <Txt kind="note" tone="lead" role="status">
        {say.count(rows.length, RULES.length)}
      </Txt>
      <Table<RuleDifference>
        label={say.table}
        rows={rows}
        keyOf={({ ruleId }) => ruleId}
        columns={[
          {
            key: 'rule',
            label: say.rule,
            onPhone: 'heading',
            cell: ({ ruleId }) => (
              <LinkText
                href={`/rules/${ruleId}`}
                label={findRule(ruleId)?.explain.title ?? ruleId}
                tone="lampblack"
              />
            ),
          },
          { key: 'a', label: sets[0].name, cell: (row) => <Side difference={row} side={0} /> },
          { key: 'b', label: sets[1].name, cell: (row) => <Side difference={row} side={1} /> },
        ]}
      />
    </View>
  )
}

function Side({ difference, side }: Readonly<{ difference: RuleDifference; side: 0 | 1 }>) {
  const words = useWords()
  const { level, params } = difference.standings[side]
  const rule = findRule(difference.ruleId)
  const settings = rule ? paramsInWords(params, difference.params, rule, words) : ''
  return (
    <View
      style={{
        flexDirection: 'row',
        gap: space.small,
        alignItems: 'flex-start',
        paddingVertical: space.tiny,
      }}
    >
      <View style={{ width: 12, paddingTop: 6 }}>
        {level === 'off' ? null : (
          <Lozenge
            kind={level === 'law' ? 'filled' : 'hollow'}
            tone={level === 'law' ? 'minium' : 'orpiment'}
          />
        )}
      </View>
      <View style={{ flex: 1, minWidth: 0 }}>
        <Txt tone={level === 'off' ? 'lead' : 'lampblack'}>{words.rules.level[level]}</Txt>
        {settings ? (
          <Txt kind="note" tone="lead">
            {settings}
          </Txt>
        ) : null}
      </View>
    </View>
  )
}
