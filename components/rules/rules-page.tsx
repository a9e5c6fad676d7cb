import { useDeferredValue, useState } from 'react'
import { View } from 'react-native'
import { Frame, useSession } from '@/components/session'
import { MEASURE_PX, space } from '@/components/theme'
import { Empty, Field, Heading, LinkText, Row, Rows, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { RuleBook } from '@/shared/rules/rule-book'
import { BookAsked } from './book-asked'
import { bySection, searchPages } from './sections'

/** The whole rule book, section by section, for anybody. */
export function RulesPage() {
  const say = useWords().rules
  const { me } = useSession()
  return (
    <Frame me={me && !me.isGuest ? me : null} title={say.title} lede={say.lede}>
      <BookAsked lines={10}>{(book) => <Book book={book} />}</BookAsked>
    </Frame>
  )
}

function Book({ book }: Readonly<{ book: RuleBook }>) {
  const say = useWords().rules
  const [search, setSearch] = useState('')
  const all = Object.values(book)
  const found = searchPages(useDeferredValue(search), all)
  return (
    <View style={{ gap: space.wide, maxWidth: 980 }}>
      <View style={{ gap: space.small, maxWidth: 420 }}>
        <Field kind="search" label={say.search} value={search} maxLength={100} onChangeText={setSearch} />
        <Txt kind="note" tone="lead" role="status">
          {say.count(found.length, all.length)}
        </Txt>
      </View>
      {found.length === 0 ? <Empty title={say.none}>{say.noneMore}</Empty> : null}
      {bySection(found).map(({ section, pages }) => (
        <View key={section} style={{ gap: space.half }}>
          <Heading level={2}>{say.section[section]}</Heading>
          <Rows label={say.section[section]}>
            {pages.map(({ id, title, statement }) => (
              <Row key={id}>
                <LinkText
                  href={`/rules/${id}`}
                  label={title}
                  isStrong
                  style={{ paddingVertical: space.tiny }}
                />
                <Txt tone="lead" style={{ maxWidth: MEASURE_PX }}>
                  {statement}
                </Txt>
              </Row>
            ))}
          </Rows>
        </View>
      ))}
    </View>
  )
}
