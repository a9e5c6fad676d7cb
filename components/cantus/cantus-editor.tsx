import { useRouter } from 'expo-router'
import { useState } from 'react'
import { View } from 'react-native'
import { RefusalNotice, useAct, callApi } from '@/components/api'
import type { Highlight } from '@/components/score'
import { Frame } from '@/components/session'
import { space, useWidth } from '@/components/theme'
import { Beside, Button, Field, Form, Heading, Notice, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { cantusBodySchema, MAX_SOURCE_CHARACTERS, type CantusBody } from '@/shared/api/cantus'
import { MAX_TITLE_CHARACTERS } from '@/shared/api/fields'
import type { Me } from '@/shared/api/people'
import { formatPitchClass } from '@/shared/theory/pitch'
import { CantusStaff } from './cantus-staff'
import type { CantusDraft } from './draft'
import { HearButton } from './hear-button'
import { MelodyFacts } from './melody-facts'
import { MelodyFindings } from './melody-findings'
import { finalProblem, notesProblems } from './problem-words'
import { ShareSelect } from './share-select'
import { TonalityFields } from './tonality-fields'
import { useDraft } from './use-draft'

/** Writing a cantus firmus, or changing one's own, with its analysis and its findings as one writes. */
export function CantusEditor({
  me,
  cantusId,
  draftId,
  start,
}: Readonly<{
  me: Me
  cantusId: string | null
  /** Under which the draft is kept in this browser. */
  draftId: string
  start: CantusDraft
}>) {
  const words = useWords()
  const say = words.cantus
  const router = useRouter()
  const { isWide } = useWidth()
  const { draft, judged, isFound, isChanged, change, discard, forget } = useDraft(draftId, start)
  const [highlight, setHighlight] = useState<Highlight | null>(null)
  const [hasTried, setTried] = useState(false)
  const [isKept, setKept] = useState(false)
  const save = useAct((body: CantusBody) =>
    cantusId
      ? callApi(api.cantus.update, { params: { cantusId }, body })
      : callApi(api.cantus.create, { body }),
  )

  const wrongNotes = notesProblems(judged, draft.clef, words)
  const isEmpty = judged.tokens.length === 0
  const notesProblem = isEmpty
    ? hasTried
      ? say.problems.noNotes
      : null
    : // A beginning is no fault: length is spoken of once somebody wants to keep it.
      wrongNotes.filter((one) => hasTried || one !== say.problems['too-short'](3)).join(' ') || null
  const wrongFinal = finalProblem(judged, words)
  const titleProblem = hasTried && draft.title.trim() === '' ? words.errors.field('empty') : null

  const keep = async () => {
    setTried(true)
    setKept(false)
    const body = cantusBodySchema.safeParse({
      title: draft.title,
      source: draft.source,
      notes: judged.notes ?? [],
      mode: judged.mode,
      final: formatPitchClass(judged.final),
      clef: draft.clef,
      courseId: draft.courseId || null,
    })
    if (!body.success || wrongNotes.length > 0 || wrongFinal) return
    const result = await save.run(body.data)
    if (!result.ok) return
    forget()
    setKept(true)
    if (!cantusId) router.replace(`/cantus/${result.value.cantus.id}` as never)
  }
  const edit = (some: Partial<CantusDraft>) => {
    setKept(false)
    change(some)
  }

  const margin = (
    <View style={{ gap: space.double }}>
      <MelodyFindings
        findings={judged.findings}
        presetId={draft.presetId}
        onPreset={(presetId) => edit({ presetId })}
        isWaiting={isEmpty || judged.notes === null}
        onPoint={setHighlight}
      />
      <View style={{ gap: space.small }}>
        <Heading level={2}>{say.facts.title}</Heading>
        {judged.analysis ? (
          <MelodyFacts analysis={judged.analysis} mode={judged.mode} final={judged.final} />
        ) : (
          <Txt tone="lead">{say.facts.waiting}</Txt>
        )}
      </View>
    </View>
  )
  return (
    <Frame
      me={me}
      title={cantusId ? start.title : say.edit.newTitle}
      up={{ href: '/cantus', label: say.edit.up }}
    >
      {isKept ? <Notice kind="good" title={say.edit.kept} /> : null}
      {isFound ? (
        <Notice title={say.edit.draftFound} action={<Button label={say.edit.discard} onPress={discard} />} />
      ) : null}
      <Beside margin={margin}>
        <View style={{ gap: space.wide }}>
          <View style={{ gap: space.half }}>
            <CantusStaff
              draft={draft}
              judged={judged}
              highlight={highlight}
              onText={(text) => edit({ text })}
            />
            <HearButton notes={judged.notes ?? []} />
          </View>
          <Form label={cantusId ? start.title : say.edit.newTitle} onSubmit={() => void keep()}>
            <Field
              label={say.edit.text}
              value={draft.text}
              onChangeText={(text) => edit({ text })}
              problem={notesProblem ?? save.problemOf('notes')}
              hint={`${say.edit.textHint} ${isWide ? say.edit.keysHint : say.edit.staffHint}`}
              rows={2}
              maxLength={400}
              isVerbatim
            />
            <TonalityFields draft={draft} judged={judged} problem={wrongFinal} onChange={edit} />
            <View style={{ flexDirection: isWide ? 'row' : 'column', gap: space.one }}>
              <View style={{ flex: isWide ? 1 : undefined }}>
                <Field
                  label={say.edit.titleLabel}
                  value={draft.title}
                  maxLength={MAX_TITLE_CHARACTERS}
                  onChangeText={(title) => edit({ title })}
                  problem={titleProblem ?? save.problemOf('title')}
                />
              </View>
              <View style={{ flex: isWide ? 1 : undefined }}>
                <Field
                  label={say.edit.source}
                  value={draft.source}
                  maxLength={MAX_SOURCE_CHARACTERS}
                  onChangeText={(source) => edit({ source })}
                  hint={say.edit.sourceHint}
                  problem={save.problemOf('source')}
                  isOptional
                />
              </View>
            </View>
            <ShareSelect value={draft.courseId} onChange={(courseId) => edit({ courseId })} />
            <RefusalNotice refusal={save.refusal} />
            <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.small }}>
              <Button
                kind="go"
                label={cantusId ? say.edit.saveChanges : say.edit.save}
                isSubmit
                isBusy={save.isBusy}
              />
              {isChanged && !isFound ? (
                <Button kind="quiet" label={say.edit.discard} onPress={discard} />
              ) : null}
            </View>
          </Form>
        </View>
      </Beside>
    </Frame>
  )
}
