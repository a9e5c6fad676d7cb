import { Button, Name, Select, Txt, type Column } from '@/components/ui'
import { formatDate, type Words } from '@/components/words'
import type { Member } from '@/shared/api/courses'
import { courseRoleSchema, type CourseRole } from '@/shared/api/fields'

/** Columns of the roster; those that change something only for who may. */
export function memberColumns({
  words,
  roles,
  myId,
  mayChange,
  onRole,
  onRemove,
}: Readonly<{
  words: Words['courses']['members']
  roles: Words['courses']['roles']
  myId: string
  mayChange: boolean
  onRole: (member: Member, role: CourseRole) => void
  onRemove: (member: Member) => void
}>): readonly Column<Member>[] {
  const facts: readonly Column<Member>[] = [
    {
      key: 'name',
      label: words.name,
      isSortable: true,
      onPhone: 'heading',
      cell: ({ name, userId }) => (
        <Txt isStrong>
          <Name>{name}</Name>
          {userId === myId ? <Txt tone="lead">{` (${words.you})`}</Txt> : null}
        </Txt>
      ),
    },
    {
      key: 'role',
      label: words.role,
      isSortable: true,
      width: '170px',
      cell: (member) =>
        mayChange && member.userId !== myId ? (
          <Select
            label={words.roleOf(member.name)}
            isLabelHidden
            value={member.role}
            options={courseRoleSchema.options.map((value) => ({ value, label: roles[value] }))}
            onChange={(role) => onRole(member, role)}
          />
        ) : (
          <Txt>{roles[member.role]}</Txt>
        ),
    },
  ]
  if (!mayChange) return facts
  return [
    facts[0] as Column<Member>,
    {
      key: 'email',
      label: words.email,
      cell: ({ email }) => <Txt>{email ? <Name isAddress>{email}</Name> : null}</Txt>,
    },
    facts[1] as Column<Member>,
    {
      key: 'joined',
      label: words.joined,
      isSortable: true,
      width: '180px',
      cell: ({ joinedAt }) => <Txt isTabular>{formatDate(joinedAt)}</Txt>,
    },
    {
      key: 'act',
      label: words.act,
      onPhone: 'foot',
      width: '110px',
      cell: (member) =>
        member.userId === myId ? null : (
          <Button
            kind="quiet"
            label={words.remove}
            hint={words.removeOf(member.name)}
            hasPopup="dialog"
            onPress={() => onRemove(member)}
          />
        ),
    },
  ]
}
