import { useDeferredValue, useMemo, useState } from 'react'
import { View } from 'react-native'
import { Asked, useQuery } from '@/components/api'
import { Score } from '@/components/score'
import { Frame } from '@/components/session'
import { space, useWidth } from '@/components/theme'
import {
  Empty,
  Field,
  Heading,
  LinkButton,
  LinkText,
  Name,
  Pager,
  Row,
  Rows,
  Select,
  Txt,
  usePageMeasure,
} from '@/components/ui'
import { useWords } from '@/components/words'
import { api } from '@/shared/api'
import type { Cantus } from '@/shared/api/cantus'
import type { Me } from '@/shared/api/people'
import { signatureOf } from '@/shared/theory/key'
import { MODES, type Mode } from '@/shared/theory/mode'
import { pitchOf } from '@/shared/theory/pitch'
import { cantusScoreOf } from './cantus-score'

const PAGE_SIZE = 30
const GROUPS: readonly Cantus['origin'][] = ['own', 'published', 'invented']

/** Every cantus one may use, with its notes in sight. */
export function CantusLibrary({ me }: Readonly<{ me: Me }>) {
  const words = useWords()
  const say = words.cantus
  const query = useQuery(api.cantus.list, {})
  const [search, setSearch] = useState('')
  const [mode, setMode] = useState<Mode | 'any'>('any')
  const [offset, setOffset] = useState(0)
  const wanted = useDeferredValue(search).trim().toLocaleLowerCase()

  const isWanted = (cantus: Cantus) =>
    (mode === 'any' || cantus.mode === mode) &&
    `${cantus.title} ${cantus.source}`.toLocaleLowerCase().includes(wanted)

  return (
    <Frame
      me={me}
      title={say.title}
      lede={say.lede}
      actions={<LinkButton kind="go" href="/cantus/new" label={say.write} />}
    >
      <View style={{ flexDirection: 'row', flexWrap: 'wrap', gap: space.one }}>
        <View style={{ flexGrow: 1, flexBasis: 220, maxWidth: 420 }}>
          <Field
            kind="search"
            label={say.search}
            value={search}
            maxLength={100}
            onChangeText={(text) => {
              setSearch(text)
              setOffset(0)
            }}
          />
        </View>
        <View style={{ flexBasis: 150 }}>
          <Select
            label={say.modeFilter}
            value={mode}
            options={[
              { value: 'any' as const, label: say.anyMode },
              ...MODES.map((value) => ({ value, label: words.lesson.mode[value] })),
            ]}
            onChange={(next) => {
              setMode(next)
              setOffset(0)
            }}
          />
        </View>
      </View>
      <Asked query={query} lines={6}>
        {({ cantus }) => {
          const found = GROUPS.flatMap((group) =>
            cantus.filter((one) => one.origin === group && isWanted(one)),
          )
          const page = found.slice(offset, offset + PAGE_SIZE)
          return (
            <>
              {found.length === 0 ? <Empty title={say.none}>{say.noneMore}</Empty> : null}
              {GROUPS.map((group) => {
                const rows = page.filter(({ origin }) => origin === group)
                return rows.length === 0 ? null : (
                  <View key={group} style={{ gap: space.small }}>
                    <Heading level={2}>{say.groups[group]}</Heading>
                    <Rows label={say.groups[group]}>
                      {rows.map((one) => (
                        <CantusRow key={one.id} cantus={one} />
                      ))}
                    </Rows>
                  </View>
                )
              })}
              <Pager
                offset={offset}
                shown={page.length}
                total={found.length}
                pageSize={PAGE_SIZE}
                onGo={setOffset}
              />
            </>
          )
        }}
      </Asked>
    </Frame>
  )
}

function CantusRow({ cantus }: Readonly<{ cantus: Cantus }>) {
  const words = useWords()
  const say = words.cantus
  const { isWide } = useWidth()
  const { contentPx } = usePageMeasure()
  const final = pitchOf(`${cantus.final}4`)
  const input = useMemo(
    () =>
      cantusScoreOf({
        notes: cantus.notes,
        clef: cantus.clef,
        signature: signatureOf(cantus.mode, pitchOf(`${cantus.final}4`)) ?? 0,
      }),
    [cantus],
  )
  return (
    <Row
      side={
        <Score
          input={input}
          size="mini"
          width={isWide ? Math.min(620, contentPx * 0.48) : contentPx}
          accessibilityLabel={cantus.title}
        />
      }
    >
      <LinkText href={`/cantus/${cantus.id}`} kind="title" tone="lampblack">
        <Name>{cantus.title}</Name>
      </LinkText>
      <Txt kind="note" tone="lead" isTabular>
        {[
          say.modeOn(words.lesson.mode[cantus.mode], words.lesson.pitchPrinted(final)),
          say.bars(cantus.notes.length),
          ...(cantus.isMine ? [say.mine] : []),
          ...(cantus.courseId ? [say.shared] : []),
        ].join(', ')}
      </Txt>
      {cantus.source ? (
        <Txt kind="note" tone="lead" face="italic">
          <Name>{cantus.source}</Name>
        </Txt>
      ) : null}
    </Row>
  )
}
