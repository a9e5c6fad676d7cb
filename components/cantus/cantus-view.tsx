import { useRouter } from 'expo-router'
import { useMemo, useState } from 'react'
import { View } from 'react-native'
import { RefusalNotice, useMutation } from '@/components/api'
import { PlayingScore } from '@/components/lesson/playing-score'
import type { Highlight } from '@/components/score'
import { Frame } from '@/components/session'
import { space } from '@/components/theme'
import { Beside, Button, Dialog, Heading, LinkButton, Name, Txt, usePageMeasure } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Cantus } from '@/shared/api/cantus'
import type { Me } from '@/shared/api/people'
import { cantusScoreOf } from './cantus-score'
import { draftOf } from './draft'
import { HearButton } from './hear-button'
import { judgeDraft } from './judge-draft'
import { MelodyFacts } from './melody-facts'
import { MelodyFindings } from './melody-findings'

/** A cantus of the library: its notes, its gestures, what it is like and what the rules say of it. */
export function CantusView({ me, cantus }: Readonly<{ me: Me; cantus: Cantus }>) {
  const words = useWords()
  const say = words.cantus
  const router = useRouter()
  const [presetId, setPresetId] = useState('open-undergrad')
  const [highlight, setHighlight] = useState<Highlight | null>(null)
  const { contentPx, besidePx } = usePageMeasure()
  const [isRemoving, setRemoving] = useState(false)
  const remove = useMutation(api.cantus.remove)
  const judged = useMemo(() => judgeDraft({ ...draftOf(cantus), presetId }), [cantus, presetId])
  const input = useMemo(
    () =>
      cantusScoreOf({
        notes: cantus.notes,
        clef: cantus.clef,
        signature: judged.signature ?? 0,
        final: judged.final,
        findings: judged.findings,
        gestures: judged.analysis?.gestures ?? [],
        gestureLabel: ({ shape }) => say.gestureNames[shape],
      }),
    [cantus, judged, say],
  )
  const removeIt = async () => {
    const result = await remove.run({ params: { cantusId: cantus.id } })
    if (result.ok) router.replace('/cantus')
  }

  return (
    <Frame
      me={me}
      title={cantus.title}
      heading={<Name>{cantus.title}</Name>}
      up={{ href: '/cantus', label: say.edit.up }}
      lede={
        <Txt tone="lead">
          {cantus.origin === 'invented' ? (
            say.invented
          ) : cantus.source ? (
            <Name>{cantus.source}</Name>
          ) : (
            say.noSource
          )}
        </Txt>
      }
      actions={
        <>
          {cantus.isMine ? (
            <>
              <Button
                kind="quiet"
                label={say.view.remove}
                hasPopup="dialog"
                onPress={() => setRemoving(true)}
              />
              <LinkButton href={`/cantus/${cantus.id}?change=1`} label={say.view.change} />
            </>
          ) : null}
          <LinkButton href={`/cantus/new?from=${cantus.id}`} label={say.view.copy} />
        </>
      }
    >
      <Beside
        margin={
          <MelodyFindings
            findings={judged.findings}
            presetId={presetId}
            onPreset={setPresetId}
            isWaiting={false}
            onPoint={setHighlight}
          />
        }
      >
        <View style={{ gap: space.wide }}>
          <PlayingScore input={input} size="page" width={contentPx - besidePx} highlight={highlight} />
          <HearButton notes={cantus.notes} />
          {judged.analysis ? (
            <View style={{ gap: space.small, maxWidth: 620 }}>
              <Heading level={2}>{say.facts.title}</Heading>
              <MelodyFacts analysis={judged.analysis} mode={judged.mode} final={judged.final} />
            </View>
          ) : null}
        </View>
      </Beside>
      <Dialog
        title={say.view.removeTitle}
        isOpen={isRemoving}
        onClose={() => setRemoving(false)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setRemoving(false)} />
            <Button
              kind="danger"
              label={say.view.remove}
              isBusy={remove.isBusy}
              onPress={() => void removeIt()}
            />
          </>
        }
      >
        <RefusalNotice refusal={remove.refusal} />
        <Txt>{say.view.removeMore}</Txt>
      </Dialog>
    </Frame>
  )
}
