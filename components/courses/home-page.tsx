import { useRouter } from 'expo-router'
import { useState } from 'react'
import { View } from 'react-native'
import { Asked, useMutation, useQuery } from '@/components/api'
import { Frame } from '@/components/session'
import { space } from '@/components/theme'
import { Button, Empty, Heading, LinkButton, LinkText, Lozenge, Name, Row, Rows, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Course } from '@/shared/api/courses'
import type { Me } from '@/shared/api/people'
import { NameDialog } from './name-dialog'

/** Where a person starts: what is open now, their courses, and a new one where they may. */
export function HomePage({ me }: Readonly<{ me: Me }>) {
  const words = useWords().courses.home
  const router = useRouter()
  const query = useQuery(api.courses.list, {})
  const make = useMutation(api.courses.create)
  const [isMaking, setMaking] = useState(false)
  const mayMake = me.mayMakeCourses || me.isAdministrator

  const create = async (name: string) => {
    const result = await make.run({ body: { name } })
    if (result.ok) router.push(`/courses/${result.value.course.id}` as never)
  }

  return (
    <Frame
      me={me}
      title={words.title}
      actions={
        <>
          <LinkButton href="/join" label={words.join} />
          {mayMake ? <Button label={words.make} hasPopup="dialog" onPress={() => setMaking(true)} /> : null}
        </>
      }
    >
      <Asked query={query}>
        {({ courses }) => (
          <>
            <OpenNow courses={courses} />
            {courses.length === 0 ? (
              <Empty title={words.none}>{mayMake ? words.noneTeacher : words.noneStudent}</Empty>
            ) : (
              <View style={{ gap: space.small }}>
                {courses.some(({ openLesson }) => openLesson) ? (
                  <Heading level={2}>{words.all}</Heading>
                ) : null}
                <CourseRows label={words.title} courses={courses.filter((course) => !course.isArchived)} />
              </View>
            )}
            <Archived courses={courses.filter((course) => course.isArchived)} />
          </>
        )}
      </Asked>
      {isMaking ? (
        <NameDialog
          title={words.makeTitle}
          goLabel={words.makeGo}
          start=""
          isOpen
          isBusy={make.isBusy}
          refusal={make.refusal}
          onClose={() => setMaking(false)}
          onName={(name) => void create(name)}
        />
      ) : null}
    </Frame>
  )
}

function OpenNow({ courses }: Readonly<{ courses: readonly Course[] }>) {
  const words = useWords().courses.home
  const open = courses.filter((course) => course.openLesson)
  if (open.length === 0) return null
  return (
    <View style={{ gap: space.small }}>
      <Heading level={2} tone="verdigris">
        {words.openNow}
      </Heading>
      <Rows label={words.openNow}>
        {open.map(
          ({ id, name, openLesson }) =>
            openLesson && (
              <Row
                key={id}
                side={<LinkButton kind="go" href={`/lessons/${openLesson.id}`} label={words.enter} />}
              >
                <View style={{ flexDirection: 'row', gap: space.half, alignItems: 'center' }}>
                  <Lozenge tone="verdigris" />
                  <View style={{ flexShrink: 1, minWidth: 0 }}>
                    <Txt kind="title">
                      <Name>{openLesson.title}</Name>
                    </Txt>
                    <Txt kind="note" tone="lead">
                      <Name>{name}</Name>
                    </Txt>
                  </View>
                </View>
              </Row>
            ),
        )}
      </Rows>
    </View>
  )
}

function CourseRows({ label, courses }: Readonly<{ label: string; courses: readonly Course[] }>) {
  const words = useWords().courses
  return (
    <Rows label={label}>
      {courses.map((course) => (
        <Row
          key={course.id}
          side={
            <Txt kind="note" tone="lead" isTabular>
              {words.home.facts(course.members, course.lessons)}
            </Txt>
          }
        >
          <LinkText href={`/courses/${course.id}`} kind="title" tone="lampblack">
            <Name>{course.name}</Name>
          </LinkText>
          <Txt kind="note" tone="lead">
            {words.roles[course.myRole]}
          </Txt>
        </Row>
      ))}
    </Rows>
  )
}

function Archived({ courses }: Readonly<{ courses: readonly Course[] }>) {
  const words = useWords().courses.home
  if (courses.length === 0) return null
  return (
    <View style={{ gap: space.small }}>
      <Heading level={2} tone="lead">
        {words.archived}
      </Heading>
      <CourseRows label={words.archived} courses={courses} />
    </View>
  )
}
