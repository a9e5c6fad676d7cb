import { useRouter } from 'expo-router'
import { useState } from 'react'
import { View } from 'react-native'
import { Asked, RefusalNotice, useMutation, useQuery } from '@/components/api'
import { space } from '@/components/theme'
import { Button, Dialog, Empty, LinkButton, LinkText, Lozenge, Name, Row, Rows, Txt } from '@/components/ui'
import { formatDateTime, useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Course } from '@/shared/api/courses'
import type { Lesson } from '@/shared/api/lessons'

const ORDER: Readonly<Record<Lesson['status'], number>> = { open: 0, prepared: 1, ended: 2 }
const timeOf = (lesson: Lesson): string => lesson.endedAt ?? lesson.openedAt ?? lesson.createdAt

/** Lessons of a course: the open one first, then the prepared, then the ended, each the newest first. */
export function LessonList({ course, mayLead }: Readonly<{ course: Course; mayLead: boolean }>) {
  const words = useWords()
  const router = useRouter()
  const query = useQuery(api.lessons.list, { params: { courseId: course.id } })
  const open = useMutation(api.lessons.open)
  const remove = useMutation(api.lessons.remove)
  const [removing, setRemoving] = useState<Lesson | null>(null)

  const openLesson = async (lesson: Lesson) => {
    const result = await open.run({ params: { lessonId: lesson.id } })
    if (result.ok) router.push(`/lessons/${lesson.id}` as never)
  }
  const removeLesson = async () => {
    if (!removing) return
    const result = await remove.run({ params: { lessonId: removing.id } })
    if (!result.ok) return
    setRemoving(null)
    query.reload()
  }

  return (
    <Asked query={query}>
      {({ lessons }) => (
        <>
          <RefusalNotice refusal={open.refusal} />
          {lessons.length === 0 ? (
            <Empty title={words.courses.course.none}>
              {mayLead ? words.courses.course.noneTeacher : words.courses.course.noneStudent}
            </Empty>
          ) : (
            <Rows label={words.courses.course.lessons} isOpen>
              {[...lessons]
                .sort((a, b) => ORDER[a.status] - ORDER[b.status] || timeOf(b).localeCompare(timeOf(a)))
                .map((lesson) => (
                  <LessonRow
                    key={lesson.id}
                    lesson={lesson}
                    mayLead={mayLead}
                    isArchived={course.isArchived}
                    isBusy={open.isBusy}
                    onOpen={() => void openLesson(lesson)}
                    onRemove={() => setRemoving(lesson)}
                  />
                ))}
            </Rows>
          )}
          <Dialog
            title={words.courses.course.removeLessonTitle(removing?.title ?? '')}
            isOpen={removing !== null}
            onClose={() => setRemoving(null)}
            actions={
              <>
                <Button label={words.common.cancel} onPress={() => setRemoving(null)} />
                <Button
                  kind="danger"
                  label={words.courses.course.removeLesson}
                  isBusy={remove.isBusy}
                  onPress={() => void removeLesson()}
                />
              </>
            }
          >
            <RefusalNotice refusal={remove.refusal} />
            <Txt>{words.courses.course.removeLessonMore}</Txt>
          </Dialog>
        </>
      )}
    </Asked>
  )
}

function LessonRow({
  lesson,
  mayLead,
  isArchived,
  isBusy,
  onOpen,
  onRemove,
}: Readonly<{
  lesson: Lesson
  mayLead: boolean
  isArchived: boolean
  isBusy: boolean
  onOpen: () => void
  onRemove: () => void
}>) {
  const words = useWords().courses.course
  const href = `/lessons/${lesson.id}`
  const isOpen = lesson.status === 'open'
  return (
    <Row
      side={
        <>
          {isOpen ? (
            <LinkButton kind="go" href={href} label={mayLead ? words.lead : words.enter} />
          ) : mayLead && !isArchived ? (
            <Button
              label={lesson.status === 'prepared' ? words.openIt : words.openAgain}
              hint={`${lesson.status === 'prepared' ? words.openIt : words.openAgain}: ${lesson.title}`}
              isBusy={isBusy}
              onPress={onOpen}
            />
          ) : null}
          {mayLead && !isOpen ? (
            <Button
              kind="quiet"
              label={words.removeLesson}
              hint={words.removeLessonOf(lesson.title)}
              hasPopup="dialog"
              onPress={onRemove}
            />
          ) : null}
        </>
      }
    >
      <View style={{ flexDirection: 'row', gap: space.half, alignItems: 'baseline' }}>
        <Lozenge
          kind={lesson.status === 'prepared' ? 'hollow' : 'filled'}
          tone={isOpen ? 'verdigris' : 'lead'}
          sizePx={11}
        />
        <View style={{ flexShrink: 1, minWidth: 0 }}>
          {mayLead || isOpen ? (
            <LinkText href={href} kind="title" tone="lampblack">
              <Name>{lesson.title}</Name>
            </LinkText>
          ) : (
            <Txt kind="title">
              <Name>{lesson.title}</Name>
            </Txt>
          )}
          <Txt kind="note" tone={isOpen ? 'verdigris' : 'lead'} isTabular>
            {isOpen ? `${words.status.open}, ` : ''}
            {words.when[lesson.status](formatDateTime(timeOf(lesson)))}
          </Txt>
        </View>
      </View>
    </Row>
  )
}
