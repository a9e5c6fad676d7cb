import { useState } from 'react'
import { View } from 'react-native'
import { callApi, RefusalNotice, useMutation } from '@/components/api'
import { space, useTheme } from '@/components/theme'
import { Button, CopyField, Dialog, Heading, LinkText, Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Lesson } from '@/shared/api/lessons'

const DEFAULT_LINK_MINUTES = 10

/** The lesson as a whole: who is here, the door and its code, the wall, opening and ending. */
export function LecternHeader({
  lesson,
  here,
  hands,
  isWide,
  onLesson,
  onPeople,
}: Readonly<{
  lesson: Lesson
  here: number
  hands: number
  isWide: boolean
  onLesson: (lesson: Lesson) => void
  onPeople: () => void
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const [dialog, setDialog] = useState<'end' | 'wall' | null>(null)
  const update = useMutation(api.lessons.update)
  const open = useMutation(api.lessons.open)
  const end = useMutation(api.lessons.end)
  const params = { lessonId: lesson.id }
  const { lectern } = words
  const isOpen = lesson.status === 'open'

  const setDoor = async (isDoorOpen: boolean) => {
    const result = await update.run({ params, body: { isDoorOpen } })
    if (result.ok) onLesson(result.value.lesson)
  }
  const openLesson = async () => {
    const result = await open.run({ params })
    if (result.ok) onLesson(result.value.lesson)
  }
  const endLesson = async () => {
    const result = await end.run({ params })
    setDialog(null)
    if (result.ok) onLesson(result.value.lesson)
  }

  return (
    <>
      <View
        style={{
          minHeight: 60,
          paddingHorizontal: isWide ? space.wide : space.one,
          paddingVertical: space.small,
          borderBottomWidth: 1,
          borderColor: colors.hairline,
          flexDirection: 'row',
          flexWrap: 'wrap',
          alignItems: 'center',
          columnGap: space.one,
          rowGap: space.tiny,
        }}
      >
        <Lozenge tone="azurite" sizePx={14} />
        <View style={{ flexGrow: 1, flexShrink: 1, flexBasis: isWide ? 200 : '80%', minWidth: 0 }}>
          <Heading level={1} kind="title">
            {lesson.title}
          </Heading>
          <LinkText href={`/courses/${lesson.courseId}`} kind="small" tone="lead">
            {lesson.courseName}
          </LinkText>
        </View>
        {isOpen ? (
          <View>
            <Button
              kind="quiet"
              label={
                hands > 0
                  ? `${words.lesson.here(here)} · ${words.lesson.hands(hands)}`
                  : words.lesson.here(here)
              }
              hint={lectern.people.jump(here, hands)}
              onPress={onPeople}
            />
          </View>
        ) : null}
        {isOpen ? (
          <View
            style={{ flexDirection: 'row', alignItems: 'center', columnGap: space.small, flexWrap: 'wrap' }}
          >
            <Txt kind="note" tone="lead">
              {lesson.isDoorOpen ? lectern.doorOpen : lectern.doorClosed}
            </Txt>
            {lesson.code && lesson.isDoorOpen ? (
              <Txt kind="title" isStrong>
                {lesson.code.replaceAll('-', ' ')}
              </Txt>
            ) : null}
            <View>
              <Button
                kind="quiet"
                label={lesson.isDoorOpen ? lectern.closeDoorShort : lectern.openDoorShort}
                hint={lesson.isDoorOpen ? lectern.closeDoor : lectern.openDoor}
                isBusy={update.isBusy}
                onPress={() => void setDoor(!lesson.isDoorOpen)}
              />
            </View>
          </View>
        ) : null}
        <View style={{ flexDirection: 'row', gap: space.small }}>
          <Button
            label={lectern.wall}
            hint={lectern.wallHint}
            hasPopup="dialog"
            onPress={() => setDialog('wall')}
          />
          {isOpen ? (
            <Button label={lectern.end} hasPopup="dialog" onPress={() => setDialog('end')} />
          ) : (
            <Button
              kind="go"
              label={lesson.status === 'ended' ? lectern.reopen : lectern.open}
              isBusy={open.isBusy}
              onPress={() => void openLesson()}
            />
          )}
        </View>
      </View>
      <RefusalNotice refusal={update.refusal ?? open.refusal ?? end.refusal} />
      <Dialog
        title={lectern.endTitle}
        isOpen={dialog === 'end'}
        onClose={() => setDialog(null)}
        actions={
          <>
            <Button label={lectern.keepOn} onPress={() => setDialog(null)} />
            <Button
              kind="danger"
              label={lectern.endGo}
              isBusy={end.isBusy}
              onPress={() => void endLesson()}
            />
          </>
        }
      >
        <Txt>{lectern.endLead}</Txt>
      </Dialog>
      <WallDialog lessonId={lesson.id} isOpen={dialog === 'wall'} onClose={() => setDialog(null)} />
    </>
  )
}

function WallDialog({
  lessonId,
  isOpen,
  onClose,
}: Readonly<{ lessonId: string; isOpen: boolean; onClose: () => void }>) {
  const words = useWords()
  const { lectern } = words
  const [link, setLink] = useState<Readonly<{ url: string; minutes: number }> | null>(null)
  const [isBusy, setBusy] = useState(false)
  const [problem, setProblem] = useState<string | null>(null)

  const makeLink = async () => {
    setBusy(true)
    const result = await callApi(api.lessons.createWallLink, { params: { lessonId } })
    setBusy(false)
    if (!result.ok) return setProblem(words.errors.of(result.reason.code).title)
    setProblem(null)
    const leftMs = new Date(result.value.expiresAt).getTime() - Date.now()
    setLink({
      url: new URL(result.value.url, window.location.origin).href,
      // A clock that is wrong by hours must not promise hours.
      minutes:
        leftMs > 0 && leftMs < 86_400_000 ? Math.max(1, Math.round(leftMs / 60_000)) : DEFAULT_LINK_MINUTES,
    })
  }

  return (
    <Dialog
      title={lectern.wall}
      isOpen={isOpen}
      onClose={() => {
        setLink(null)
        onClose()
      }}
      actions={<Button label={words.common.close} onPress={onClose} />}
    >
      <Button
        kind="go"
        isWide
        label={lectern.openWall}
        onPress={() => {
          window.open(`/lessons/${lessonId}/wall`, '_blank', 'noopener')
          onClose()
        }}
      />
      {link ? (
        <CopyField label={lectern.wallLink} value={link.url} hint={lectern.wallLinkLead(link.minutes)} />
      ) : (
        <Button isWide label={lectern.wallLink} isBusy={isBusy} onPress={() => void makeLink()} />
      )}
      {problem ? (
        <Txt kind="note" tone="minium" role="alert">
          {problem}
        </Txt>
      ) : null}
      <Txt kind="note" tone="lead">
        {lectern.wallSound}
      </Txt>
    </Dialog>
  )
}
