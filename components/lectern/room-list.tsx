import { useState, type FocusEvent } from 'react'
import { View } from 'react-native'
import type { LessonView } from '@/components/lesson/lesson-view'
import type { RoomGroup } from '@/components/lesson/room'
import { space, TOUCH_TARGET_PX } from '@/components/theme'
import { Button, EasedStack, Heading, Txt } from '@/components/ui'
import type { KnownWays } from '@/components/ways/use-ways'
import { useWords } from '@/components/words'
import { MOST_GROUPS, type LecternReading } from './lectern-model'
import { RoomRow } from './room-row'
import { useSteadyOrder } from './use-steady-order'

/** The room's distinct proposals for the bars in question, the most proposed first. */
export function RoomList({
  reading,
  view,
  ways,
  names,
  isNamed,
  onNamed,
  isWide,
  heardKey,
  onHear,
  onAdopt,
}: Readonly<{
  reading: LecternReading
  view: LessonView
  ways: KnownWays
  names: ReadonlyMap<string, string>
  isNamed: boolean
  onNamed: (isNamed: boolean) => void
  isWide: boolean
  /** The proposal that sounds now. */
  heardKey: string | null
  onHear: (group: RoomGroup) => void
  /** Null when the lesson has ended. */
  onAdopt: ((group: RoomGroup) => void) | null
}>) {
  const words = useWords().lectern.room
  const { bars, groups, finished, unfinished, distinct } = reading
  const isSpan = bars.length > 1
  const isOpen = bars.some((bar) => view.bars[bar]?.state === 'released')
  const rest = groups.length - MOST_GROUPS
  // Nobody may press what has just come under the pointer in another's place.
  const [isPointed, setPointed] = useState(false)
  const [isKeyed, setKeyed] = useState(false)
  const rows = useSteadyOrder(groups, isPointed || isKeyed)
  return (
    <View role="region" aria-label={bars.length > 0 ? words.title(bars) : words.titleNone}>
      <View
        style={{
          flexDirection: 'row',
          flexWrap: 'wrap',
          alignItems: 'center',
          columnGap: space.one,
          minHeight: TOUCH_TARGET_PX,
        }}
      >
        <Heading level={2}>{bars.length > 0 ? words.title(bars) : words.titleNone}</Heading>
        <View role="status" style={{ flexGrow: 1 }}>
          {bars.length > 0 ? (
            <Txt kind="note" tone="lead" isTabular>
              {words.summary(finished, distinct, isSpan)}
              {unfinished > 0 ? ` · ${words.unfinished(unfinished)}` : ''}
            </Txt>
          ) : null}
        </View>
        {groups.length > 0 ? (
          <Button
            kind="quiet"
            label={isNamed ? words.hideProposers : words.showProposers}
            onPress={() => onNamed(!isNamed)}
          />
        ) : null}
      </View>
      {groups.length > 0 ? (
        <div
          role="list"
          onPointerEnter={() => setPointed(true)}
          onPointerLeave={() => setPointed(false)}
          onFocus={(event: FocusEvent) => setKeyed(event.target.matches(':focus-visible'))}
          onBlur={() => setKeyed(false)}
        >
          <EasedStack>
            {rows.slice(0, MOST_GROUPS).map((group) => (
              <RoomRow
                key={group.key}
                group={group}
                view={view}
                ways={ways(group.key)}
                names={isNamed ? names : null}
                isWide={isWide}
                isHeard={heardKey === group.key}
                isSpan={isSpan}
                onHear={onHear}
                onAdopt={onAdopt}
              />
            ))}
          </EasedStack>
          {rest > 0 ? (
            <Txt kind="note" tone="lead" style={{ paddingVertical: space.half }}>
              {words.rest(rest)}
            </Txt>
          ) : null}
        </div>
      ) : (
        <Txt tone="lead" style={{ paddingVertical: space.small }}>
          {bars.length === 0 ? words.emptyNone : isOpen ? words.empty(bars) : words.emptyFrozen(bars)}
        </Txt>
      )}
    </View>
  )
}
