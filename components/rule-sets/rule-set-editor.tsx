import { useRouter } from 'expo-router'
import { useCallback, useMemo, useState, type ReactNode } from 'react'
import { View } from 'react-native'
import { callApi, RefusalNotice, useAct, useMutation } from '@/components/api'
import { ShareSelect } from '@/components/cantus/share-select'
import { Frame } from '@/components/session'
import { space, useTheme, useWidth } from '@/components/theme'
import {
  Button,
  Dialog,
  Field,
  Form,
  Heading,
  LinkButton,
  Notice,
  Select,
  Txt,
  usePageMeasure,
} from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { MAX_RULE_SET_NAME_CHARACTERS } from '@/shared/api/fields'
import type { Me } from '@/shared/api/people'
import type { KeptRuleSet, RuleSetBody } from '@/shared/api/rule-sets'
import { settingsOf } from '@/shared/rule-sets/rule-set-file'
import { ruleSetProblems, type Level, type RuleId, type RuleSet, type Species } from '@/shared/rules'
import { changedRules, tidyRules, withRuleLevel, withRuleParam } from './change-rules'
import { ConflictNotice, useConflicts } from './conflict-notice'
import { downloadRuleSet } from './download-rule-set'
import { RuleList } from './rule-list'

const LIST_PX = 980
const SPECIES = ['1', '2', '3', '4', '5'] as const

/** A rule set being made or changed: its name, who may use it, and every rule with what a change does. */
export function RuleSetEditor({
  me,
  start,
  keptAs,
  basedOn,
}: Readonly<{ me: Me; start: RuleSet; keptAs: KeptRuleSet | null; basedOn: string | null }>) {
  const words = useWords()
  const say = words.ruleSets
  const router = useRouter()
  const { isWide } = useWidth()
  const { contentPx } = usePageMeasure()
  const [before, setBefore] = useState(start.rules)
  const [rules, setRules] = useState(start.rules)
  const [name, setName] = useState(
    keptAs ? start.name : say.ownName(start.name).slice(0, MAX_RULE_SET_NAME_CHARACTERS),
  )
  const [courseId, setCourseId] = useState(keptAs?.courseId ?? '')
  const [species, setSpecies] = useState<(typeof SPECIES)[number] | 'all'>('1')
  const [hasTried, setTried] = useState(false)
  const [isKept, setKept] = useState(false)
  const [isRemoving, setRemoving] = useState(false)
  const save = useAct((body: RuleSetBody) =>
    keptAs
      ? callApi(api.ruleSets.update, { params: { ruleSetId: keptAs.id }, body })
      : callApi(api.ruleSets.create, { body }),
  )
  const remove = useMutation(api.ruleSets.remove)

  const changed = useMemo(() => changedRules(rules, before), [rules, before])
  const onLevel = useCallback((id: RuleId, level: Level) => {
    setKept(false)
    setRules((now) => withRuleLevel(now, id, level))
  }, [])
  const onParam = useCallback((id: RuleId, param: string, value: unknown) => {
    setKept(false)
    setRules((now) => withRuleParam(now, id, param, value))
  }, [])
  const hasBadParams = useMemo(
    () => ruleSetProblems({ id: 'draft', name: 'draft', rules }).length > 0,
    [rules],
  )
  const conflicts = useConflicts(rules)
  const isNameEmpty = name.trim() === ''

  const keep = async () => {
    setTried(true)
    if (isNameEmpty || hasBadParams) return
    const result = await save.run({
      name,
      basedOn,
      courseId: courseId || null,
      rules: settingsOf(tidyRules(rules)),
    })
    if (!result.ok) return
    setKept(true)
    setBefore(rules)
    if (!keptAs) router.replace(`/rule-sets/${result.value.ruleSet.id}` as never)
  }
  const removeIt = async () => {
    if (!keptAs) return
    const result = await remove.run({ params: { ruleSetId: keptAs.id } })
    if (result.ok) router.replace('/rule-sets' as never)
  }

  const listPx = Math.min(LIST_PX, contentPx)
  return (
    <Frame
      me={me}
      title={keptAs ? start.name : say.newTitle}
      up={{ href: '/rule-sets', label: say.up }}
      lede={keptAs ? undefined : say.newLede(start.name)}
      actions={
        keptAs ? (
          <>
            <Button kind="quiet" label={say.remove} hasPopup="dialog" onPress={() => setRemoving(true)} />
            <Button
              kind="quiet"
              label={say.export}
              onPress={() => downloadRuleSet({ id: keptAs.id, name, rules }, basedOn)}
            />
            <LinkButton
              href={`/rule-sets/compare?a=${keptAs.id}${basedOn ? `&b=${basedOn}` : ''}`}
              label={say.compareThis}
            />
            <LinkButton href={`/rule-sets/new?from=${keptAs.id}`} label={say.makeOwn} />
          </>
        ) : undefined
      }
    >
      <Form label={keptAs ? start.name : say.newTitle} onSubmit={() => void keep()} gapPx={space.wide}>
        <View style={{ flexDirection: isWide ? 'row' : 'column', gap: space.one, maxWidth: LIST_PX }}>
          <View style={{ flex: isWide ? 1 : undefined }}>
            <Field
              label={say.name}
              value={name}
              maxLength={MAX_RULE_SET_NAME_CHARACTERS}
              problem={hasTried && isNameEmpty ? words.errors.field('empty') : save.problemOf('name')}
              onChangeText={(text) => {
                setKept(false)
                setName(text)
              }}
            />
          </View>
          <View style={{ flex: isWide ? 1 : undefined }}>
            <ShareSelect
              value={courseId}
              onChange={(id) => {
                setKept(false)
                setCourseId(id)
              }}
            />
          </View>
        </View>
        <View style={{ maxWidth: LIST_PX }}>
          <ConflictNotice conflicts={conflicts} />
        </View>
      </Form>
      <View style={{ gap: space.half, maxWidth: LIST_PX }}>
        <Heading level={2}>{say.rules}</Heading>
        <View style={{ maxWidth: 280 }}>
          <Select
            label={say.species}
            value={species}
            options={[
              ...SPECIES.map((value) => ({
                value,
                label: words.lesson.species[Number(value) as Species],
              })),
              { value: 'all' as const, label: say.everySpecies },
            ]}
            onChange={setSpecies}
          />
        </View>
        <RuleList
          rules={rules}
          before={before}
          changed={changed}
          species={species === 'all' ? null : (Number(species) as Species)}
          widthPx={listPx}
          onLevel={onLevel}
          onParam={onParam}
        />
      </View>
      <KeepBar>
        {isKept ? <Notice kind="good" title={say.kept} /> : null}
        <RefusalNotice refusal={save.refusal} />
        {hasTried && hasBadParams ? (
          <Txt kind="note" tone="minium" role="alert">
            {words.errors.field('bad-params')}
          </Txt>
        ) : null}
        <View
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            alignItems: 'center',
            columnGap: space.one,
            rowGap: space.tiny,
          }}
        >
          <Button
            kind="go"
            label={keptAs ? say.keepChanges : say.keep}
            isBusy={save.isBusy}
            onPress={() => void keep()}
          />
          {changed.length > 0 ? (
            <Button kind="quiet" label={say.undo} onPress={() => setRules(before)} />
          ) : null}
          <Txt kind="note" tone={changed.length > 0 ? 'verdigris' : 'lead'} role="status">
            {say.changes(changed.length)}
          </Txt>
          {conflicts.length > 0 ? (
            <Txt kind="note" tone="orpiment" role="status">
              {`${say.conflicts.title}.`}
            </Txt>
          ) : null}
        </View>
      </KeepBar>
      <Dialog
        title={say.removeTitle}
        isOpen={isRemoving}
        onClose={() => setRemoving(false)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setRemoving(false)} />
            <Button kind="danger" label={say.remove} isBusy={remove.isBusy} onPress={() => void removeIt()} />
          </>
        }
      >
        <RefusalNotice refusal={remove.refusal} />
        <Txt>{say.removeMore}</Txt>
      </Dialog>
    </Frame>
  )
}

/** What is to be kept stays in reach at the foot of the window, however long the list of rules. */
function KeepBar({ children }: Readonly<{ children: ReactNode }>) {
  const { colors } = useTheme()
  return (
    <div
      style={{
        position: 'sticky',
        bottom: 0,
        display: 'flex',
        flexDirection: 'column',
        gap: space.small,
        padding: `${space.half}px 0`,
        background: colors.vellum,
        borderTop: `1px solid ${colors.hairline}`,
        zIndex: 2,
      }}
    >
      {children}
    </div>
  )
}
