import { useMemo } from 'react'
import { View } from 'react-native'
import { RubricLine } from '@/components/lesson/rubric-line'
import { rubricOf } from '@/components/lesson/rubrics'
import { space, useTheme } from '@/components/theme'
import { Lozenge, Txt } from '@/components/ui'
import { useWords } from '@/components/words'
import type { Finding } from '@/shared/rules'
import { findingsAt } from './desk-model'

/** What the rules say of the bar in hand, then of the rest, then the task. */
export function DeskRubric({
  notices,
  findings,
  hand,
  released,
  hasWritten,
  prompt,
  heightPx,
}: Readonly<{
  /** What hinders the work: out of touch, not opened yet. They come first, and in this place, so that they move nothing. */
  notices: readonly string[]
  /** Null while the teacher keeps findings back. */
  findings: readonly Finding[] | null
  hand: number
  released: readonly number[]
  hasWritten: boolean
  prompt: string
  /** A place of one height, so that nothing below moves when a finding comes; null lets it grow. */
  heightPx: number | null
}>) {
  const words = useWords()
  const { colors } = useTheme()
  const rubrics = useMemo(() => {
    const here = findingsAt(findings ?? [], hand)
    const elsewhere = (findings ?? []).filter(({ bars }) => !bars.includes(hand))
    return [...here, ...elsewhere].map((finding, index) => ({
      rubric: rubricOf(finding, words),
      isHere: index < here.length,
    }))
  }, [findings, hand, words])
  const task = prompt ? (
    <Txt kind="text" tone={rubrics.length > 0 ? 'lead' : 'lampblack'}>
      {prompt}
    </Txt>
  ) : null
  const state =
    released.length === 0
      ? words.desk.closed.nothingReleased
      : findings === null
        ? words.desk.rubric.hidden
        : hasWritten
          ? words.desk.rubric.none
          : words.desk.rubric.empty(released)
  return (
    <View
      role="status"
      style={{
        backgroundColor: colors.leaf,
        borderTopWidth: 1,
        borderBottomWidth: 1,
        borderColor: colors.hairline,
        // Outside what scrolls, so that lines are cut between and never through.
        paddingVertical: space.half - 2,
        ...(heightPx === null ? {} : { height: heightPx }),
      }}
    >
      <div
        tabIndex={heightPx === null ? undefined : 0}
        role={heightPx === null ? undefined : 'group'}
        aria-label={heightPx === null ? undefined : words.desk.rubric.label}
        style={{
          flex: 1,
          overflowY: heightPx === null ? 'visible' : 'auto',
          padding: `0 ${heightPx === null ? space.double : space.one}px`,
          display: 'flex',
          flexDirection: 'column',
          gap: space.small,
          outlineOffset: -3,
        }}
      >
        {notices.map((notice) => (
          <View key={notice} style={{ flexDirection: 'row', gap: space.small }}>
            <View style={{ paddingTop: 5 }}>
              <Lozenge kind="hollow" tone="orpiment" />
            </View>
            <Txt kind="note" tone="orpiment" style={{ flex: 1, minWidth: 0 }}>
              {notice}
            </Txt>
          </View>
        ))}
        {rubrics.length > 0 ? (
          <>
            {rubrics.map(({ rubric, isHere }) => (
              <RubricLine key={rubric.id} rubric={rubric} isMendTold={isHere} hasWhy />
            ))}
            {task}
          </>
        ) : (
          <>
            {task}
            {task && released.length === 0 ? null : (
              <Txt kind={task ? 'note' : 'text'} tone="lead">
                {state}
              </Txt>
            )}
          </>
        )}
      </div>
    </View>
  )
}
