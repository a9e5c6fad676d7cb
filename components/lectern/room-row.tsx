import { memo, useMemo } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricsOf } from '@/components/lesson/rubrics'
import { miniScoreOf } from '@/components/lesson/score-of'
import type { LessonView } from '@/components/lesson/lesson-view'
import type { RoomGroup } from '@/components/lesson/room'
import { Score } from '@/components/score'
import { space, useTheme } from '@/components/theme'
import { Button, Name, Txt } from '@/components/ui'
import { WaysFigure } from '@/components/ways/ways-figure'
import type { WaysAnswer } from '@/components/ways/ways-messages'
import { useWords } from '@/components/words'

const MOST_NAMES = 4
const MOST_FINDINGS = 2
const MINI_PX = 214
const COUNT_PX = 52

/** One distinct proposal: how many made it, how it looks, what is said of it, who they are, and what can be done with it. */
export const RoomRow = memo(function RoomRow({
  group,
  view,
  ways,
  names,
  isWide,
  isHeard,
  isSpan,
  onHear,
  onAdopt,
}: Readonly<{
  group: RoomGroup
  view: LessonView
  /** Null while it is being counted. */
  ways: WaysAnswer | null
  /** Null while the teacher does not want to see who. */
  names: ReadonlyMap<string, string> | null
  isWide: boolean
  isHeard: boolean
  isSpan: boolean
  onHear: (group: RoomGroup) => void
  /** Null when the lesson has ended. */
  onAdopt: ((group: RoomGroup) => void) | null
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const mini = useMemo(() => miniScoreOf(view, group.notes, group.findings), [view, group])
  const rubrics = useMemo(() => rubricsOf(group.findings, words), [group.findings, words])
  const shown = rubrics.slice(0, MOST_FINDINGS)
  const bars = Object.keys(group.notes).map(Number)
  const score = (
    <Score
      input={mini}
      size="mini"
      width={isSpan ? MINI_PX : 96}
      ground={colors.leaf}
      accessibilityLabel={words.lectern.room.proposalLabel(bars)}
    />
  )
  return (
    <View
      role="listitem"
      style={{
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        minHeight: 82,
        paddingVertical: space.small,
        flexDirection: isWide ? 'row' : 'column',
        alignItems: isWide ? 'center' : 'stretch',
        gap: isWide ? space.one : space.small,
      }}
    >
      <View style={{ flexDirection: 'row', alignItems: 'center', gap: space.one }}>
        <Txt kind="head" isStrong isTabular align="right" style={{ width: COUNT_PX }}>
          {String(group.count)}
        </Txt>
        <View style={{ width: isSpan ? MINI_PX : 96 }}>{score}</View>
      </View>
      <View style={{ flex: isWide ? 1 : undefined, minWidth: 0, gap: 2 }}>
        {shown.length === 0 ? <Txt kind="note">{words.lectern.room.noFinding}</Txt> : null}
        {shown.map((rubric) => (
          <RubricLine key={rubric.id} rubric={rubric} kind="note" isMendTold={false} hasWhy />
        ))}
        {rubrics.length > shown.length ? (
          <Txt kind="note" tone="lead">
            {words.lectern.room.more(rubrics.length - shown.length)}
          </Txt>
        ) : null}
        <Txt kind="note" tone="lead" lines={2}>
          {group.isComplete ? '' : `${words.lectern.room.begun} `}
          {names ? (
            <Proposers memberIds={group.memberIds} names={names} />
          ) : (
            words.lectern.room.hiddenCount(group.count)
          )}
        </Txt>
      </View>
      <WaysFigure ways={ways} isWide={isWide} />
      <View style={{ flexDirection: 'row', gap: space.small, justifyContent: 'flex-end' }}>
        <Button
          label={isHeard ? words.lectern.stop : words.lectern.room.hear}
          hint={words.lectern.room.hearSpoken(group.count)}
          onPress={() => onHear(group)}
        />
        {onAdopt ? (
          <Button
            kind={rubrics.some(({ tone }) => tone === 'breach') ? 'plain' : 'go'}
            label={words.lectern.room.adopt}
            hint={words.lectern.room.adoptSpoken(group.count)}
            onPress={() => onAdopt(group)}
          />
        ) : null}
      </View>
    </View>
  )
})

function Proposers({
  memberIds,
  names,
}: Readonly<{ memberIds: readonly string[]; names: ReadonlyMap<string, string> }>) {
  const words = useWords().lectern
  const known = memberIds
    .map((id) => names.get(id) ?? words.people.someone)
    .sort((a, b) => a.localeCompare(b))
  const told = known.length > MOST_NAMES ? known.slice(0, MOST_NAMES - 1) : known
  return (
    <>
      {told.map((name, index) => (
        <Txt key={index} kind="note" tone="lead">
          {index === 0 ? '' : index === known.length - 1 ? ` ${words.room.and} ` : ', '}
          <Name>{name}</Name>
        </Txt>
      ))}
      {known.length > told.length ? ` ${words.room.andMore(known.length - told.length)}` : ''}
    </>
  )
}
