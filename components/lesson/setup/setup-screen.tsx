import { useRouter, type Href } from 'expo-router'
import { useCallback, useMemo, useState } from 'react'
import { View } from 'react-native'
import { Asked, RefusalNotice, useMutation, useQuery } from '@/components/api'
import { RuleList } from '@/components/rule-sets/rule-list'
import { RuleSetSelect } from '@/components/rule-sets/rule-set-select'
import { Frame } from '@/components/session'
import { space, useTheme, useWidth } from '@/components/theme'
import { Button, Choice, Field, Form, Heading, Select, Txt } from '@/components/ui'
import { usePageMeasure } from '@/components/ui/use-page-measure'
import { useWords, type Words } from '@/components/words'
import { api } from '@/shared/api'
import type { Cantus } from '@/shared/api/cantus'
import { MAX_TITLE_CHARACTERS } from '@/shared/api/fields'
import type { Me } from '@/shared/api/people'
import { findPreset, PRESETS, type Position, type RuleSet, type Species } from '@/shared/rules'
import { MODES, type Mode } from '@/shared/theory/mode'
import { MAX_PROMPT_CHARACTERS } from '@/shared/wire/documents'
import { CantusPicker } from './cantus-picker'
import {
  changedInForm,
  exerciseOf,
  firstStage,
  setupProblems,
  startForm,
  withCantus,
  withFinal,
  withLevel,
  withParam,
  withPosition,
  withPreset,
  type SetupForm,
  type SetupProblem,
} from './setup-form'
import { SetupPreview } from './setup-preview'
import { doubtsOf } from './soundness'
import { CLEF_CHOICES } from './suggest-clefs'

/** Width of the column in which the melody is chosen. */
const PICKER_PX = 440
const FIRST_PRESET = 'open-undergrad'
const SPECIES = ['1', '2', '3', '4', '5'] as const
type SpeciesValue = (typeof SPECIES)[number]
const FINALS = ['C', 'C#', 'Db', 'D', 'Eb', 'E', 'F', 'F#', 'G', 'Ab', 'A', 'Bb', 'B'] as const

/** Setting up a lesson: the melody, what is done with it, by which rules, and the first task. */
export function SetupScreen({ me, courseId }: Readonly<{ me: Me; courseId: string }>) {
  const words = useWords()
  const course = useQuery(api.courses.get, { params: { courseId } })
  const library = useQuery(api.cantus.list, {})
  return (
    <Frame
      me={me}
      title={words.setup.title}
      lede={words.setup.lead}
      up={{ href: `/courses/${courseId}`, label: course.data?.course.name ?? words.courses.course.up }}
    >
      <Asked query={library}>{({ cantus }) => <Setup courseId={courseId} library={cantus} />}</Asked>
    </Frame>
  )
}

function Setup({ courseId, library }: Readonly<{ courseId: string; library: readonly Cantus[] }>) {
  const words = useWords()
  const { setup, lesson } = words
  const router = useRouter()
  const { isWide } = useWidth()
  const create = useMutation(api.lessons.create)
  const [form, setForm] = useState<SetupForm>(() =>
    startForm(findPreset(FIRST_PRESET) ?? (PRESETS[0] as RuleSet), setup.promptSuggestion),
  )
  const [isListOpen, setListOpen] = useState(false)
  const [hasTried, setTried] = useState(false)

  const titleOf = useCallback(
    (position: Position, final: string) =>
      setup.titleSuggestion(position, final.replace('#', '♯').replace('b', '♭')),
    [setup],
  )
  const problems = setupProblems(form)
  const problemOf = (...kinds: SetupProblem[]): string | null => {
    const problem = problems.find((each) => kinds.includes(each))
    return hasTried && problem ? problemText(problem, words) : null
  }
  const exercise = useMemo(() => exerciseOf(form), [form])
  const doubts = useMemo(() => (exercise ? doubtsOf(exercise) : []), [exercise])
  const changed = useMemo(() => changedInForm(form), [form])

  const submit = async () => {
    setTried(true)
    if (problems.length > 0 || !exercise) return
    const result = await create.run({
      params: { courseId },
      body: { title: form.title, exercise, stage: firstStage(form) },
    })
    if (result.ok) router.replace(`/lessons/${result.value.lesson.id}/lectern` as Href)
  }

  const { contentPx } = usePageMeasure()
  const previewPx = isWide ? contentPx - PICKER_PX - space.double : contentPx

  return (
    <Form label={setup.title} onSubmit={() => void submit()} gapPx={space.wide}>
      <View style={{ flexDirection: isWide ? 'row' : 'column', gap: isWide ? space.double : space.wide }}>
        <View style={{ width: isWide ? PICKER_PX : undefined, gap: space.wide }}>
          <Section title={setup.cantus}>
            <CantusPicker
              library={library}
              chosen={form.cantus}
              problem={problemOf('noCantus')}
              onChoose={(cantus) => setForm((before) => withCantus(before, cantus, titleOf))}
            />
          </Section>
          <Section title={setup.work}>
            <Choice<Position>
              label={setup.position}
              value={form.position}
              options={[
                { value: 'above', label: setup.above },
                { value: 'below', label: setup.below },
              ]}
              onChange={(position) => setForm((before) => withPosition(before, position, titleOf))}
            />
            <Select<SpeciesValue>
              label={setup.species}
              value={`${form.species}`}
              options={SPECIES.map((value) => ({ value, label: lesson.species[Number(value) as Species] }))}
              onChange={(value) => setForm((before) => ({ ...before, species: Number(value) as Species }))}
            />
            <Pair>
              <Select<Mode>
                label={setup.mode}
                value={form.mode}
                options={MODES.map((mode) => ({ value: mode, label: lesson.mode[mode] }))}
                onChange={(mode) => setForm((before) => ({ ...before, mode }))}
                problem={problemOf('noSpelling')}
              />
              <Select
                label={setup.final}
                value={form.final}
                options={FINALS.map((final) => ({
                  value: final,
                  label: final.replace('#', '♯').replace('b', '♭'),
                }))}
                onChange={(final) => setForm((before) => withFinal(before, final, titleOf))}
              />
            </Pair>
            <Pair>
              <Select
                label={setup.clefLine}
                value={form.clefs.line}
                options={CLEF_CHOICES.map((clef) => ({ value: clef, label: lesson.clef[clef] }))}
                onChange={(line) =>
                  setForm((before) => ({ ...before, isClefsTouched: true, clefs: { ...before.clefs, line } }))
                }
              />
              <Select
                label={setup.clefCantus}
                value={form.clefs.cantus}
                options={CLEF_CHOICES.map((clef) => ({ value: clef, label: lesson.clef[clef] }))}
                onChange={(cantus) =>
                  setForm((before) => ({
                    ...before,
                    isClefsTouched: true,
                    clefs: { ...before.clefs, cantus },
                  }))
                }
              />
            </Pair>
          </Section>
        </View>
        <View style={{ flex: 1, minWidth: 0, gap: space.wide }}>
          <Section title={setup.preview}>
            <SetupPreview exercise={exercise} form={form} doubts={doubts} widthPx={previewPx} />
          </Section>
          <Section title={setup.words}>
            <Field
              label={setup.lessonTitle}
              value={form.title}
              maxLength={MAX_TITLE_CHARACTERS}
              problem={problemOf('titleEmpty', 'titleTooLong', 'titleHidden') ?? create.problemOf('title')}
              onChangeText={(title) => setForm((before) => ({ ...before, title, isTitleTouched: true }))}
            />
            <Field
              label={setup.prompt}
              value={form.prompt}
              rows={2}
              isOptional
              maxLength={MAX_PROMPT_CHARACTERS}
              hint={setup.promptHint}
              problem={problemOf('promptTooLong')}
              onChangeText={(prompt) => setForm((before) => ({ ...before, prompt }))}
            />
          </Section>
          <Section title={setup.rules}>
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', alignItems: 'flex-end', gap: space.one }}>
              <View style={{ minWidth: 240 }}>
                <RuleSetSelect
                  label={setup.ruleSet}
                  value={form.preset.id}
                  onChoose={(chosen) => setForm((before) => withPreset(before, chosen))}
                />
              </View>
              <View>
                <Button
                  label={isListOpen ? setup.rulesClose : setup.rulesOpen}
                  onPress={() => setListOpen(!isListOpen)}
                />
              </View>
              {changed.length > 0 ? (
                <View>
                  <Button
                    kind="quiet"
                    label={setup.rulesReset}
                    onPress={() => setForm((before) => withPreset(before, before.preset))}
                  />
                </View>
              ) : null}
            </View>
            {changed.length > 0 ? (
              <Txt kind="note" tone="verdigris" role="status">
                {setup.rulesChanged(changed.length)}
              </Txt>
            ) : null}
            {problemOf('params') ? (
              <Txt kind="note" tone="minium" role="alert">
                {problemOf('params')}
              </Txt>
            ) : null}
            {isListOpen ? (
              <RuleList
                key={form.preset.id}
                rules={form.ruleSet.rules}
                before={form.preset.rules}
                species={form.species}
                widthPx={previewPx}
                changed={changed}
                onLevel={(id, level) => setForm((before) => withLevel(before, id, level))}
                onParam={(id, name, value) => setForm((before) => withParam(before, id, name, value))}
              />
            ) : null}
          </Section>
          <View style={{ gap: space.half }}>
            <RefusalNotice refusal={create.refusal} />
            {create.refusal ? (
              <Txt kind="note" tone="lead">
                {setup.problems.notSent}
              </Txt>
            ) : null}
            {hasTried && problems.length > 0 ? (
              <Txt kind="note" tone="minium" role="alert">
                {problems.map((problem) => problemText(problem, words)).join(' ')}
              </Txt>
            ) : null}
            <Button kind="go" label={setup.create} isSubmit isBusy={create.isBusy} />
          </View>
        </View>
      </View>
    </Form>
  )
}

const problemText = (problem: SetupProblem, { setup: { problems } }: Words): string => {
  if (problem === 'titleTooLong') return problems.titleTooLong(MAX_TITLE_CHARACTERS)
  if (problem === 'promptTooLong') return problems.promptTooLong(MAX_PROMPT_CHARACTERS)
  return problems[problem]
}

function Section({ title, children }: Readonly<{ title: string; children: React.ReactNode }>) {
  const { colors } = useTheme()
  return (
    <View
      role="group"
      aria-label={title}
      style={{ gap: space.half, borderTopWidth: 1, borderColor: colors.hairline, paddingTop: space.half }}
    >
      <Heading level={2}>{title}</Heading>
      {children}
    </View>
  )
}

function Pair({ children }: Readonly<{ children: [React.ReactNode, React.ReactNode] }>) {
  return (
    <View style={{ flexDirection: 'row', gap: space.half, alignItems: 'flex-end' }}>
      <View style={{ flex: 1, minWidth: 0 }}>{children[0]}</View>
      <View style={{ flex: 1, minWidth: 0 }}>{children[1]}</View>
    </View>
  )
}
