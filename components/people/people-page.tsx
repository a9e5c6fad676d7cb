import { useDeferredValue, useState } from 'react'
import { View } from 'react-native'
import { Asked, RefusalNotice, useMutation, useQuery, type ReplyOf } from '@/components/api'
import { Frame } from '@/components/session'
import { Empty, Field, Name, Pager, Table, Toggle, Txt, type Column } from '@/components/ui'
import { formatDate, useWords } from '@/components/words'
import { api } from '@/shared/api'
import { PAGE_SIZE } from '@/shared/api/fields'
import type { Me } from '@/shared/api/people'

type Person = ReplyOf<typeof api.people.list>['items'][number]

/** Administrator: who has an account, and who may make courses. */
export function PeoplePage({ me }: Readonly<{ me: Me }>) {
  const words = useWords().people
  const [search, setSearch] = useState('')
  const [offset, setOffset] = useState(0)
  const query = useQuery(api.people.list, { query: { offset, search: useDeferredValue(search) } })
  const update = useMutation(api.people.update)

  const setMayMake = async (person: Person, mayMakeCourses: boolean) => {
    const result = await update.run({ params: { userId: person.id }, body: { mayMakeCourses } })
    if (result.ok) query.reload()
  }
  const columns: readonly Column<Person>[] = [
    {
      key: 'name',
      label: words.name,
      onPhone: 'heading',
      width: '28%',
      cell: (person) => (
        <Txt isStrong>
          <Name>{person.name}</Name>
          {person.isAdministrator ? <Txt kind="note" tone="lead">{` ${words.administrator}`}</Txt> : null}
        </Txt>
      ),
    },
    {
      key: 'email',
      label: words.email,
      cell: (person) => (
        <Txt>
          {person.email ? <Name isAddress>{person.email}</Name> : null}
          {person.isVerified ? null : <Txt kind="note" tone="orpiment">{` ${words.unconfirmed}`}</Txt>}
        </Txt>
      ),
    },
    {
      key: 'courses',
      label: words.courses,
      align: 'right',
      width: '90px',
      cell: (person) => <Txt isTabular>{person.courses}</Txt>,
    },
    {
      key: 'since',
      label: words.since,
      width: '190px',
      cell: (person) => <Txt isTabular>{formatDate(person.createdAt)}</Txt>,
    },
    {
      key: 'may',
      label: words.mayMake,
      onPhone: 'line',
      width: '150px',
      cell: (person) => (
        <Toggle
          label={person.mayMakeCourses ? words.yes : words.no}
          spoken={words.mayMakeFor(person.name)}
          value={person.mayMakeCourses}
          onChange={(mayMake) => void setMayMake(person, mayMake)}
        />
      ),
    },
  ]
  return (
    <Frame me={me} title={words.title} lede={words.lede}>
      {query.refusal?.code === 'forbidden' ? null : (
        <View style={{ maxWidth: 420 }}>
          <Field
            kind="search"
            label={words.search}
            value={search}
            maxLength={100}
            onChangeText={(text) => {
              setSearch(text)
              setOffset(0)
            }}
          />
        </View>
      )}
      <RefusalNotice refusal={update.refusal} />
      <Asked query={query} lines={8}>
        {({ items, total }) => (
          <>
            {items.length === 0 ? (
              <Empty title={words.none} />
            ) : (
              <Table label={words.title} columns={columns} rows={items} keyOf={(person) => person.id} />
            )}
            <Pager offset={offset} shown={items.length} total={total} pageSize={PAGE_SIZE} onGo={setOffset} />
          </>
        )}
      </Asked>
    </Frame>
  )
}
