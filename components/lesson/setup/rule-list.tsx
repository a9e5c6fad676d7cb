import { memo, useMemo, useState } from 'react'
import { View } from 'react-native'
import { space, useTheme } from '@/components/theme'
import { Button, Choice, Field, Select, Toggle, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { AnyRule, Level, RuleId, RuleSet, RuleSetting } from '@/shared/rules'
import { formatParam, paramFields, parseParam, type ParamField } from './params-fields'
import { findRules } from './setup-form'

/** Rules drawn at once; a search narrows the rest. */
const STEP = 12

/** Every rule that governs the species, one by one: what it says, how it counts, and its parameters. */
export function RuleList({
  ruleSet,
  changed,
  onLevel,
  onParam,
}: Readonly<{
  ruleSet: RuleSet
  changed: readonly RuleId[]
  onLevel: (ruleId: RuleId, level: Level) => void
  onParam: (ruleId: RuleId, name: string, value: unknown) => void
}>) {
  const words = useWords()
  const { setup, common } = words
  const [search, setSearch] = useState('')
  const [shownCount, setShownCount] = useState(STEP)
  const all = useMemo(() => findRules('', 1), [])
  const found = useMemo(() => findRules(search, 1), [search])
  return (
    <View style={{ gap: space.small }}>
      <Field
        label={setup.rulesSearch}
        kind="search"
        value={search}
        onChangeText={(text) => {
          setSearch(text)
          setShownCount(STEP)
        }}
      />
      <Txt kind="note" tone="lead" role="status">
        {found.length === 0 ? setup.rulesNone : setup.rulesCount(found.length, all.length)}
      </Txt>
      <View role="list" aria-label={setup.rules}>
        {found.slice(0, shownCount).map((rule) => (
          <RuleRow
            key={rule.id}
            rule={rule}
            setting={ruleSet.rules[rule.id]}
            isChanged={changed.includes(rule.id)}
            onLevel={onLevel}
            onParam={onParam}
          />
        ))}
      </View>
      {found.length > shownCount ? (
        <Button
          label={setup.rulesMore(found.length - shownCount)}
          onPress={() => setShownCount(found.length)}
        />
      ) : null}
      {search && found.length === 0 ? (
        <Button kind="quiet" label={common.back} onPress={() => setSearch('')} />
      ) : null}
    </View>
  )
}

const RuleRow = memo(function RuleRow({
  rule,
  setting,
  isChanged,
  onLevel,
  onParam,
}: Readonly<{
  rule: AnyRule
  setting: RuleSetting | undefined
  isChanged: boolean
  onLevel: (ruleId: RuleId, level: Level) => void
  onParam: (ruleId: RuleId, name: string, value: unknown) => void
}>) {
  const words = useWords().setup
  const { colors } = useTheme()
  const fields = useMemo(() => paramFields(rule.params), [rule])
  const level = setting?.level ?? 'off'
  const problems = useMemo(() => {
    const parsed = rule.params.safeParse(setting?.params ?? {})
    return new Set(parsed.success ? [] : parsed.error.issues.map(({ path }) => String(path[0] ?? '')))
  }, [rule, setting])
  return (
    <View
      role="listitem"
      style={{
        paddingVertical: space.half,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        gap: space.small,
      }}
    >
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          alignItems: 'flex-start',
          columnGap: space.wide,
          rowGap: space.small,
        }}
      >
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: 280, minWidth: 0 }}>
          <Txt isStrong>
            {rule.explain.title}
            {isChanged ? <Txt kind="note" tone="verdigris">{`  ${words.ruleChanged}`}</Txt> : null}
          </Txt>
          <Txt kind="note" tone="lead">
            {rule.explain.statement}
          </Txt>
        </View>
        <Choice<Level>
          label={words.levelLabel(rule.explain.title)}
          isLabelHidden
          value={level}
          options={[
            { value: 'law', label: words.level.law },
            { value: 'preference', label: words.level.preference },
            { value: 'off', label: words.level.off },
          ]}
          onChange={(next) => onLevel(rule.id, next)}
        />
      </View>
      {fields.length > 0 && level !== 'off' ? (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one, alignItems: 'flex-start' }}>
          {fields.map((field) => (
            <ParamControl
              key={field.name}
              field={field}
              value={setting?.params?.[field.name] ?? field.fallback}
              hasProblem={problems.has(field.name)}
              onChange={(value) => onParam(rule.id, field.name, value)}
            />
          ))}
        </View>
      ) : null}
    </View>
  )
})

function ParamControl({
  field,
  value,
  hasProblem,
  onChange,
}: Readonly<{ field: ParamField; value: unknown; hasProblem: boolean; onChange: (value: unknown) => void }>) {
  const words = useWords().setup
  const { control } = field
  const [text, setText] = useState(() => formatParam(control, value))
  const [isUnread, setUnread] = useState(false)
  const hint = field.description ?? undefined
  if (control.kind === 'switch')
    return <Toggle label={field.label} value={value === true} onChange={onChange} hint={hint} />
  if (control.kind === 'choice')
    return (
      <View style={{ width: 280, maxWidth: '100%' }}>
        <Select
          label={field.label}
          value={String(value)}
          options={control.options.map((option) => ({ value: option, label: option.replaceAll('-', ' ') }))}
          onChange={onChange}
          hint={hint}
        />
      </View>
    )
  return (
    <View style={{ width: control.kind === 'list' || control.kind === 'json' ? 280 : 150, maxWidth: '100%' }}>
      <Field
        label={field.label}
        value={text}
        isVerbatim
        hint={control.kind === 'list' && control.options ? words.paramList(control.options) : hint}
        problem={isUnread || hasProblem ? words.paramProblem : null}
        onChangeText={(next) => {
          setText(next)
          const read = parseParam(control, next)
          setUnread(read === undefined)
          if (read !== undefined) onChange(read)
        }}
      />
    </View>
  )
}
