import { memo, useDeferredValue, useMemo, useState } from 'react'
import { View } from 'react-native'
import { BookAsked } from '@/components/rules/book-asked'
import { searchPages } from '@/components/rules/sections'
import { space, useTheme } from '@/components/theme'
import { Button, Choice, Field, LinkText, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import {
  findRule,
  type AnyRule,
  type Level,
  type RuleId,
  type RuleSet,
  type RuleSetting,
  type Species,
} from '@/shared/rules'
import type { RuleBook, RulePage } from '@/shared/rules/rule-book'
import { ParamControl } from './param-control'
import { paramFields } from './params-fields'
import { RuleTrial } from './rule-trial'

/** Rules drawn at once; a search narrows the rest. */
const STEP = 12

type RuleListProps = Readonly<{
  rules: RuleSet['rules']
  /** What they were: what a change is told against. */
  before: RuleSet['rules']
  changed: readonly RuleId[]
  /** Only rules that govern this species; null for all. */
  species: Species | null
  widthPx: number
  onLevel: (ruleId: RuleId, level: Level) => void
  onParam: (ruleId: RuleId, name: string, value: unknown) => void
}>

/** The rules of a set one by one: what each says, how it counts, its parameters, and what that does to an example. */
export function RuleList(props: RuleListProps) {
  return <BookAsked lines={8}>{(book) => <ListOfBook {...props} book={book} />}</BookAsked>
}

function ListOfBook({
  book,
  rules,
  before,
  changed,
  species,
  widthPx,
  onLevel,
  onParam,
}: RuleListProps & Readonly<{ book: RuleBook }>) {
  const words = useWords()
  const { setup, common } = words
  const [search, setSearch] = useState('')
  const [shownCount, setShownCount] = useState(STEP)
  const all = useMemo(
    () => Object.values(book).filter((page) => species === null || page.species.includes(species)),
    [book, species],
  )
  const found = searchPages(useDeferredValue(search), all)
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
        {found.slice(0, shownCount).map((page) => {
          const rule = findRule(page.id)
          return rule ? (
            <RuleRow
              key={page.id}
              rule={rule}
              page={page}
              setting={rules[page.id]}
              before={before[page.id]}
              isChanged={changed.includes(page.id)}
              widthPx={widthPx}
              onLevel={onLevel}
              onParam={onParam}
            />
          ) : null
        })}
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
  page,
  setting,
  before,
  isChanged,
  widthPx,
  onLevel,
  onParam,
}: Readonly<{
  rule: AnyRule
  page: RulePage
  setting: RuleSetting | undefined
  before: RuleSetting | undefined
  isChanged: boolean
  widthPx: number
  onLevel: (ruleId: RuleId, level: Level) => void
  onParam: (ruleId: RuleId, name: string, value: unknown) => void
}>) {
  const { setup: words, ruleSets: say } = useWords()
  const { colors } = useTheme()
  const [isTried, setTried] = useState(false)
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
            <LinkText
              href={`/rules/${rule.id}`}
              label={rule.explain.title}
              tone="lampblack"
              isStrong
              style={{ paddingVertical: space.tiny }}
            />
            {isChanged ? <Txt kind="note" tone="verdigris">{`  ${words.ruleChanged}`}</Txt> : null}
          </Txt>
          <Txt kind="note" tone="lead">
            {page.statement}
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
      <View style={{ marginLeft: -space.small }}>
        <Button
          kind="quiet"
          label={isTried ? say.tryItClose : say.tryIt}
          hint={isTried ? undefined : say.tryItSpoken(rule.explain.title)}
          onPress={() => setTried(!isTried)}
        />
      </View>
      {isTried ? <RuleTrial rule={rule} page={page} before={before} now={setting} widthPx={widthPx} /> : null}
    </View>
  )
})
