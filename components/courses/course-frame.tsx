import { View } from 'react-native'
import type { ReactNode } from 'react'
import { Frame } from '@/components/session'
import { space, useTheme } from '@/components/theme'
import { LinkText, Name } from '@/components/ui'
import { useWords } from '@/components/words'
import { canInCourse } from '@/shared/api/course-acts'
import type { Course } from '@/shared/api/courses'
import type { Me } from '@/shared/api/people'

const PLACES = ['lessons', 'members'] as const

/** The page of a course, with the two things there are in it: lessons and people. */
export function CourseFrame({
  me,
  course,
  here,
  actions,
  children,
}: Readonly<{
  me: Me
  course: Course | null
  here: 'lessons' | 'members'
  actions?: ReactNode
  children: ReactNode
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const name = course?.name ?? words.courses.course.title
  return (
    <Frame
      me={me}
      title={here === 'members' && course ? `${words.courses.members.title}, ${name}` : name}
      heading={course ? <Name>{course.name}</Name> : words.courses.course.title}
      up={{ href: '/home', label: words.courses.course.up }}
      actions={actions}
    >
      {course && canInCourse(course.myRole, 'see members') ? (
        <View
          style={{
            flexDirection: 'row',
            gap: space.wide,
            borderBottomWidth: 1,
            borderColor: colors.hairline,
          }}
        >
          {PLACES.map((place) => (
            <View
              key={place}
              style={{
                marginBottom: -1,
                borderBottomWidth: 3,
                borderColor: place === here ? colors.azurite : 'transparent',
              }}
            >
              <LinkText
                href={place === 'lessons' ? `/courses/${course.id}` : `/courses/${course.id}/members`}
                isCurrent={place === here}
                isStrong={place === here}
                tone={place === here ? 'lampblack' : 'lead'}
                label={words.courses.course[place]}
                style={{ textDecorationLine: 'none', paddingVertical: 10 }}
              />
            </View>
          ))}
        </View>
      ) : null}
      {course ? <View style={{ gap: space.one, marginTop: -space.one }}>{children}</View> : children}
    </Frame>
  )
}
