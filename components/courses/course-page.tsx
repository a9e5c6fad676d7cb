import { useState } from 'react'
import { Asked, useMutation, useQuery } from '@/components/api'
import { Button, Dialog, LinkButton, Notice, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { canInCourse } from '@/shared/api/course-acts'
import type { Course } from '@/shared/api/courses'
import type { Me } from '@/shared/api/people'
import { CourseFrame } from './course-frame'
import { LessonList } from './lesson-list'
import { NameDialog } from './name-dialog'

const leads = (course: Course): boolean => canInCourse(course.myRole, 'prepare lesson')
const owns = (course: Course): boolean => canInCourse(course.myRole, 'change course')

/** A course: its lessons, and for its teacher the course itself. */
export function CoursePage({ me, courseId }: Readonly<{ me: Me; courseId: string }>) {
  const words = useWords()
  const query = useQuery(api.courses.get, { params: { courseId } })
  const course = query.data?.course ?? null
  const update = useMutation(api.courses.update)
  const [asking, setAsking] = useState<'name' | 'archive' | null>(null)

  const change = async (body: { name?: string; isArchived?: boolean }) => {
    const result = await update.run({ params: { courseId }, body })
    if (!result.ok) return
    query.setData(result.value)
    setAsking(null)
  }
  const own = course && owns(course) ? course : null

  return (
    <CourseFrame
      me={me}
      course={course}
      here="lessons"
      actions={
        <>
          {own && !own.isArchived ? (
            <>
              <Button
                kind="quiet"
                label={words.courses.course.rename}
                hasPopup="dialog"
                onPress={() => setAsking('name')}
              />
              <Button
                kind="quiet"
                label={words.courses.course.archive}
                hasPopup="dialog"
                onPress={() => setAsking('archive')}
              />
            </>
          ) : null}
          {course && leads(course) && !course.isArchived ? (
            <LinkButton
              kind="go"
              href={`/courses/${courseId}/new-lesson`}
              label={words.courses.course.prepare}
            />
          ) : null}
        </>
      }
    >
      <Asked query={query}>
        {({ course: shown }) => (
          <>
            {shown.isArchived ? (
              <Notice
                title={words.courses.course.archivedTitle}
                action={
                  owns(shown) ? (
                    <Button
                      label={words.courses.course.unarchive}
                      isBusy={update.isBusy}
                      onPress={() => void change({ isArchived: false })}
                    />
                  ) : null
                }
              >
                {words.courses.course.archivedMore}
              </Notice>
            ) : null}
            <LessonList course={shown} mayLead={leads(shown)} />
          </>
        )}
      </Asked>
      {own && asking === 'name' ? (
        <NameDialog
          title={words.courses.course.renameTitle}
          goLabel={words.courses.course.rename}
          start={own.name}
          isOpen
          isBusy={update.isBusy}
          refusal={update.refusal}
          onClose={() => setAsking(null)}
          onName={(name) => void change({ name })}
        />
      ) : null}
      <Dialog
        title={words.courses.course.archiveTitle}
        isOpen={asking === 'archive'}
        onClose={() => setAsking(null)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setAsking(null)} />
            <Button
              kind="danger"
              label={words.courses.course.archive}
              isBusy={update.isBusy}
              onPress={() => void change({ isArchived: true })}
            />
          </>
        }
      >
        <Txt>{words.courses.course.archiveMore}</Txt>
      </Dialog>
    </CourseFrame>
  )
}
