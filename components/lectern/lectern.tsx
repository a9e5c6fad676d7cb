import { useCallback, useDeferredValue, useMemo, useRef, useState } from 'react'
import { useWindowDimensions, View } from 'react-native'
import { selectedBars, type Selection } from '@/components/lesson/bars'
import { rubricsOf, setAsideRubrics, type Rubric } from '@/components/lesson/rubrics'
import type { RoomGroup } from '@/components/lesson/room'
import { useLessonView } from '@/components/lesson/use-lesson-view'
import { space, useTheme, useWidth } from '@/components/theme'
import { Button, EasedStack, Notice, Txt, useTitle } from '@/components/ui'
import { useLecternWays } from '@/components/ways/use-lectern-ways'
import { useWords } from '@/components/words'
import type { Highlight } from '@/components/score'
import type { Lesson } from '@/shared/api/lessons'
import type { BoardState, ChorusState } from '@/shared/board'
import type { Line } from '@/shared/theory/note'
import type { StageSettings } from '@/shared/wire/documents'
import type { PresentMember } from '@/shared/wire/rooms'
import { BarActButtons, type BarAct } from './bar-acts'
import { HearingDialog } from './hearing-dialog'
import { LecternHeader } from './lectern-header'
import { actsFor, NO_ACTS, readLectern, sortPeople } from './lectern-model'
import { LineFindings } from './line-findings'
import { PeoplePanel } from './people-panel'
import { RoomList } from './room-list'
import { SelectableScore } from './selectable-score'
import { TaskPanel } from './task-panel'
import { useHearing, type WallCue } from './use-hearing'

const SIDE_PX = 280
/** The score's place is kept whatever stands in it; a higher window gives it more. */
const LEAST_SCORE_PX = 290
const MOST_SCORE_PX = 440
const SCORE_SHARE = 0.37

/** Every act of the lectern on the board; each is one change of the document. */
export type LecternPen = Readonly<{
  act: (act: BarAct, bars: readonly number[]) => void
  adopt: (notes: Line) => void
  /** Undoes an adoption: the bars stand again as they stood. */
  undoAdopt: (notes: Line, before: BoardState) => void
  stage: (patch: Partial<StageSettings>) => void
}>

export type LecternProps = Readonly<{
  lesson: Lesson
  board: BoardState
  chorus: ChorusState
  here: number
  hands: number
  /** Null until they are known. */
  people: readonly PresentMember[] | null
  /** Names of everyone who ever came in, by member id. */
  names: ReadonlyMap<string, string>
  isOffline: boolean
  hindrance: 'database' | 'disk-full' | null
  pen: LecternPen
  onLesson: (lesson: Lesson) => void
  onLower: (memberId: string) => void
  onRemove: (memberId: string) => void
  onCue: (cue: WallCue) => void
}>

const NOTHING: Selection = null

/** The teacher's place: the score and every act on it, the room's proposals, the task, the class. */
export function Lectern(props: LecternProps) {
  const { lesson, board, pen } = props
  // A room of hundreds may speak faster than rows can be drawn: typing and pressing go first.
  const chorus = useDeferredValue(props.chorus)
  const words = useWords()
  useTitle(lesson.title)
  const { colors } = useTheme()
  const { widthPx, isWide } = useWidth()
  const { height: heightPx } = useWindowDimensions()
  const scorePx = Math.round(Math.min(MOST_SCORE_PX, Math.max(LEAST_SCORE_PX, heightPx * SCORE_SHARE)))
  const { view, judge } = useLessonView(board)
  const [selection, setSelection] = useState<Selection>(NOTHING)
  const [isNamed, setNamed] = useState(true)
  const [isHearingOpen, setHearingOpen] = useState(false)
  const [adopted, setAdopted] = useState<Readonly<{ notes: Line; before: BoardState }> | null>(null)
  const [pointedAt, setPointedAt] = useState<Rubric | null>(null)
  const peopleAnchor = useRef<View>(null)

  const selected = useMemo(
    () => selectedBars(selection).filter((bar) => bar >= 1 && bar <= view.barCount),
    [selection, view.barCount],
  )
  const reading = useMemo(() => readLectern(view, chorus, judge, selected), [view, chorus, judge, selected])
  const ways = useLecternWays(view, reading.groups)
  const isReadOnly = lesson.status === 'ended'
  const acts = useMemo(
    () => (isReadOnly ? NO_ACTS : actsFor(view, chorus, selected)),
    [isReadOnly, view, chorus, selected],
  )
  const lineRubrics = useMemo(
    () => [...rubricsOf(judge.ofLine(), words), ...setAsideRubrics(view, words)],
    [judge, view, words],
  )
  const people = useMemo(() => props.people && sortPeople(props.people), [props.people])
  const hearing = useHearing(view, props.onCue)
  const { hear, stop, playingId } = hearing

  const act = useCallback(
    (kind: BarAct, bars: readonly number[]) => {
      setAdopted(null)
      pen.act(kind, bars)
    },
    [pen],
  )
  const hearGroup = useCallback(
    (group: RoomGroup) => {
      if (playingId === group.key) return stop()
      const bars = Object.keys(group.notes).map(Number)
      // One bar of what stands on either side, so that it is heard how the proposal is come to and left.
      const from = Math.max(1, Math.min(...bars) - 1)
      const to = Math.min(view.barCount, Math.max(...bars) + 1)
      hear(group.key, [from, to], group.notes)
    },
    [hear, stop, playingId, view.barCount],
  )
  const latestBoard = useRef(board)
  latestBoard.current = board
  const adopt = useCallback(
    (group: RoomGroup) => {
      setAdopted({ notes: group.notes, before: latestBoard.current })
      pen.adopt(group.notes)
    },
    [pen],
  )
  const hearSelection = () => (playingId === 'line' ? stop() : hear('line', selected))

  const suggestion = useMemo(
    () => (reading.bars.length > 0 ? words.lectern.stage.suggest(reading.bars, view.barCount) : null),
    [reading.bars, words, view.barCount],
  )
  const highlight: Highlight | null = pointedAt && {
    fromBar: pointedAt.bars[0] ?? 1,
    toBar: pointedAt.bars.at(-1) ?? 1,
    tone: pointedAt.tone,
  }
  const marginPx = isWide ? space.wide : space.one
  const scoreWidthPx = (isWide ? widthPx - SIDE_PX : widthPx) - 2 * marginPx

  const side = (
    <>
      {isReadOnly ? null : <TaskPanel stage={view.stage} suggestion={suggestion} onStage={pen.stage} />}
      <View ref={peopleAnchor}>
        <PeoplePanel people={people} onLower={props.onLower} onRemove={props.onRemove} />
      </View>
    </>
  )
  const main = (
    <View style={{ flex: 1, minWidth: 0 }}>
      <View style={{ paddingHorizontal: marginPx, paddingTop: space.half, gap: space.small }}>
        <View
          style={{
            flexDirection: 'row',
            flexWrap: 'wrap',
            alignItems: 'center',
            justifyContent: 'space-between',
            columnGap: space.one,
            rowGap: space.tiny,
            minHeight: 44,
          }}
        >
          <View
            role="status"
            style={{ flexDirection: 'row', alignItems: 'center', gap: space.small, minHeight: 44 }}
          >
            <Txt kind="note" tone="lead">
              {adopted
                ? words.lectern.adopted(Object.keys(adopted.notes).map(Number))
                : selected.length > 0
                  ? words.lectern.selection(selected)
                  : words.lectern.nothingSelected}
            </Txt>
            {adopted ? (
              <View>
                <Button
                  label={words.lectern.undo}
                  onPress={() => {
                    pen.undoAdopt(adopted.notes, adopted.before)
                    setAdopted(null)
                  }}
                />
              </View>
            ) : null}
          </View>
          <BarActButtons
            bars={selected}
            acts={acts}
            isHearing={playingId === 'line'}
            hasLine={Object.keys(view.line).length > 0}
            onAct={act}
            onHear={hearSelection}
            onHearing={() => setHearingOpen(true)}
          />
        </View>
        <View style={{ minHeight: isWide ? scorePx : undefined, paddingBottom: space.one }}>
          <SelectableScore
            input={reading.score}
            width={scoreWidthPx}
            maxHeight={isWide ? scorePx - space.one : undefined}
            selection={selection}
            onSelect={setSelection}
            highlight={highlight}
            label={words.lectern.scoreLabel}
          />
        </View>
        {hearing.problem ? <Notice kind="note" title={hearing.problem} /> : null}
      </View>
      <View
        style={{
          flexGrow: 1,
          backgroundColor: colors.leaf,
          borderTopWidth: 1,
          borderColor: colors.hairline,
          paddingHorizontal: marginPx,
          paddingTop: space.half,
          paddingBottom: space.wide,
        }}
      >
        <EasedStack gapPx={space.wide}>
          <RoomList
            key="room"
            reading={reading}
            view={view}
            ways={ways}
            names={props.names}
            isNamed={isNamed}
            onNamed={setNamed}
            isWide={isWide}
            heardKey={playingId}
            onHear={hearGroup}
            onAdopt={isReadOnly ? null : adopt}
          />
          <LineFindings
            key="line"
            ways={ways('')}
            rubrics={lineRubrics}
            hasLine={Object.keys(view.line).length > 0}
            onPoint={setPointedAt}
            onSelect={setSelection}
          />
          {isWide ? null : (
            <View key="side" style={{ gap: space.wide }}>
              {side}
            </View>
          )}
        </EasedStack>
      </View>
    </View>
  )

  return (
    <View role="main" id="page" style={{ flexGrow: 1, minHeight: '100dvh' as never }}>
      <LecternHeader
        lesson={lesson}
        here={props.here}
        hands={props.hands}
        isWide={isWide}
        onLesson={props.onLesson}
        onPeople={() =>
          (peopleAnchor.current as unknown as HTMLElement | null)?.scrollIntoView({ block: 'start' })
        }
      />
      {props.isOffline ? <Notice kind="note" title={words.lesson.connection.offlineTeacher} /> : null}
      {props.hindrance ? <Notice kind="bad" title={words.lesson.hindrance[props.hindrance]} /> : null}
      {lesson.status === 'prepared' ? <Notice kind="note" title={words.lectern.openLead} /> : null}
      {lesson.status === 'ended' ? <Notice kind="note" title={words.lectern.endedLead} /> : null}
      <View style={{ flex: 1, flexDirection: isWide ? 'row' : 'column' }}>
        {isWide ? (
          <View
            style={{
              width: SIDE_PX,
              borderRightWidth: 1,
              borderColor: colors.hairline,
              paddingHorizontal: space.one + 4,
              paddingVertical: space.one,
              gap: space.wide,
            }}
          >
            {side}
          </View>
        ) : null}
        {main}
      </View>
      <HearingDialog
        isOpen={isHearingOpen}
        settings={hearing.settings}
        onChange={hearing.setSettings}
        onClose={() => setHearingOpen(false)}
      />
    </View>
  )
}
