import { useQuery } from '@/components/api'
import { Select } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { canInCourse } from '@/shared/api/course-acts'

/** Who may use a cantus: its writer, or all who teach in a course. */
export function ShareSelect({
  value,
  onChange,
}: Readonly<{ value: string; onChange: (courseId: string) => void }>) {
  const words = useWords().cantus.edit
  const courses = useQuery(api.courses.list, {}).data?.courses ?? []
  return (
    <Select
      label={words.share}
      value={value}
      onChange={onChange}
      options={[
        { value: '', label: words.shareMe },
        ...courses
          .filter(
            ({ id, myRole, isArchived }) =>
              id === value || (!isArchived && canInCourse(myRole, 'share cantus')),
          )
          .map(({ id, name }) => ({ value: id, label: words.shareWith(name) })),
      ]}
    />
  )
}
