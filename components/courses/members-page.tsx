import { useDeferredValue, useState } from 'react'
import { View } from 'react-native'
import { Asked, RefusalNotice, useMutation, useQuery } from '@/components/api'
import { space, useWidth } from '@/components/theme'
import { Button, Dialog, Empty, Field, Pager, Select, Table, Txt, type Sort } from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import { canInCourse } from '@/shared/api/course-acts'
import type { Member } from '@/shared/api/courses'
import { PAGE_SIZE, type CourseRole } from '@/shared/api/fields'
import type { Me } from '@/shared/api/people'
import { CourseFrame } from './course-frame'
import { InviteDialog } from './invite-dialog'
import { memberColumns } from './member-columns'

type SortKey = 'name' | 'role' | 'joined'

/** Everybody in a course, as a roster its teacher can change. */
export function MembersPage({ me, courseId }: Readonly<{ me: Me; courseId: string }>) {
  const words = useWords()
  const { isWide } = useWidth()
  const course = useQuery(api.courses.get, { params: { courseId } }).data?.course ?? null
  const [search, setSearch] = useState('')
  const [offset, setOffset] = useState(0)
  const [sort, setSort] = useState<Sort>({ by: 'name', direction: 'up' })
  const members = useQuery(api.courses.members, {
    params: { courseId },
    query: {
      offset,
      search: useDeferredValue(search).trim(),
      sort: sort.by as SortKey,
      direction: sort.direction,
    },
  })
  const updateMember = useMutation(api.courses.updateMember)
  const removeMember = useMutation(api.courses.removeMember)
  const [removing, setRemoving] = useState<Member | null>(null)
  const [isInviting, setInviting] = useState(false)
  const mayChange = course !== null && canInCourse(course.myRole, 'change members')

  const setRole = async (member: Member, role: CourseRole) => {
    await updateMember.run({ params: { courseId, userId: member.userId }, body: { role } })
    members.reload()
  }
  const remove = async () => {
    if (!removing) return
    const result = await removeMember.run({ params: { courseId, userId: removing.userId } })
    if (!result.ok) return
    setRemoving(null)
    members.reload()
  }
  const columns = memberColumns({
    words: words.courses.members,
    roles: words.courses.roles,
    myId: me.id,
    mayChange,
    onRole: (member, role) => void setRole(member, role),
    onRemove: (member) => {
      removeMember.reset()
      setRemoving(member)
    },
  })

  return (
    <CourseFrame
      me={me}
      course={course}
      here="members"
      actions={
        mayChange ? (
          <Button
            kind="go"
            label={words.courses.members.invite}
            hasPopup="dialog"
            onPress={() => setInviting(true)}
          />
        ) : null
      }
    >
      {members.refusal?.code === 'forbidden' ? null : (
        <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one, alignItems: 'flex-end' }}>
          <View style={{ flexGrow: 1, flexBasis: 240, maxWidth: 420 }}>
            <Field
              kind="search"
              label={words.courses.members.search}
              value={search}
              maxLength={100}
              onChangeText={(text) => {
                setSearch(text)
                setOffset(0)
              }}
            />
          </View>
          {isWide ? null : <SortSelect sort={sort} onSort={setSort} />}
        </View>
      )}
      <RefusalNotice refusal={updateMember.refusal} />
      <Asked query={members} lines={8}>
        {({ items, total }) => (
          <>
            {items.length === 0 ? (
              <Empty title={words.courses.members.none} />
            ) : (
              <Table
                label={words.courses.members.title}
                columns={columns}
                rows={items}
                keyOf={(member) => member.userId}
                sort={sort}
                onSort={(next) => {
                  setSort(next)
                  setOffset(0)
                }}
              />
            )}
            <Pager offset={offset} shown={items.length} total={total} pageSize={PAGE_SIZE} onGo={setOffset} />
          </>
        )}
      </Asked>
      <Dialog
        title={words.courses.members.removeTitle}
        isOpen={removing !== null}
        onClose={() => setRemoving(null)}
        actions={
          <>
            <Button label={words.common.cancel} onPress={() => setRemoving(null)} />
            <Button
              kind="danger"
              label={words.courses.members.remove}
              isBusy={removeMember.isBusy}
              onPress={() => void remove()}
            />
          </>
        }
      >
        <RefusalNotice refusal={removeMember.refusal} />
        <Txt>{words.courses.members.removeMore(removing?.name ?? '')}</Txt>
      </Dialog>
      {isInviting ? <InviteDialog courseId={courseId} onClose={() => setInviting(false)} /> : null}
    </CourseFrame>
  )
}

/** On a phone there are no column heads to press. */
function SortSelect({ sort, onSort }: Readonly<{ sort: Sort; onSort: (sort: Sort) => void }>) {
  const words = useWords().courses.members
  return (
    <View style={{ flexBasis: 130, flexGrow: 1 }}>
      <Select
        label={words.sortLabel}
        value={sort.by}
        options={[
          { value: 'name', label: words.name },
          { value: 'role', label: words.role },
          { value: 'joined', label: words.joined },
        ]}
        onChange={(by) => onSort({ by, direction: 'up' })}
      />
    </View>
  )
}
