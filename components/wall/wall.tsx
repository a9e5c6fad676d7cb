import { useDeferredValue, useMemo } from 'react'
import { useWindowDimensions, View } from 'react-native'
import { PlayingScore } from '@/components/lesson/playing-score'
import { ScoreText } from '@/components/lesson/score-text'
import { speakScore } from '@/components/lesson/spoken'
import { useLessonView } from '@/components/lesson/use-lesson-view'
import { useWholeWindow } from '@/components/lesson/use-whole-window'
import { useTheme } from '@/components/theme'
import { useTitle } from '@/components/ui'
import { useWays } from '@/components/ways/use-ways'
import { useWords } from '@/components/words'
import type { Lesson } from '@/shared/api/lessons'
import type { BoardState, ChorusState } from '@/shared/board'
import { readWall } from './wall-model'
import { WallFooter } from './wall-footer'
import { WallHeader } from './wall-header'
import { WallMargin } from './wall-margin'
import { MARGIN_TYPE, marginRoom, measureWall } from './wall-measure'

export type WallProps = Readonly<{
  lesson: Lesson
  board: BoardState
  chorus: ChorusState
  here: number
  /** Names by member id; only while the teacher lets the wall show them. */
  names: ReadonlyMap<string, string> | null
  /** Something to say at the foot: out of touch, asleep. */
  notice: string | null
  /** The one control a wall may have: browsers ask for a touch before a page may sound. */
  onLetSound: (() => void) | null
}>

/** What is projected: the score, the room, what is said of both, the task, and the way in. */
export function Wall(props: WallProps) {
  const { lesson, board } = props
  // A room of hundreds may speak at once: what it says is read and drawn between frames.
  const chorus = useDeferredValue(props.chorus)
  const words = useWords()
  const { colors } = useTheme()
  useWholeWindow()
  useTitle(lesson.title)
  const { width, height } = useWindowDimensions()
  const measure = useMemo(() => measureWall(width, height), [width, height])
  const { view, judge } = useLessonView(board)
  const hasSquare = lesson.code !== null && lesson.isDoorOpen && lesson.status === 'open'
  const hasNames = props.names !== null
  const wall = useMemo(
    () => readWall(view, chorus, judge, words, marginRoom(measure, hasSquare, hasNames)),
    [view, chorus, judge, words, measure, hasSquare, hasNames],
  )
  const sentences = useMemo(() => speakScore(view, view.line, null, words), [view, words])
  const isWaysTold = view.stage.showsWays !== 'nobody'
  const ofLine = useMemo(() => (isWaysTold ? [{ key: '', line: view.line }] : null), [isWaysTold, view.line])
  const ways = useWays(view, ofLine)('')
  const { isStacked, marginPx } = measure
  return (
    <View
      role="main"
      id="page"
      style={{
        backgroundColor: colors.vellum,
        paddingHorizontal: marginPx,
        ...(isStacked ? { minHeight: '100dvh' as never } : { height: '100dvh' as never, overflow: 'hidden' }),
      }}
    >
      <WallHeader lesson={lesson} view={view} measure={measure} />
      <ScoreText title={words.desk.textTitle} sentences={sentences} />
      <View
        style={
          isStacked
            ? { gap: measure.gapPx }
            : { flex: 1, flexDirection: 'row', gap: measure.gapPx, minHeight: 0 }
        }
      >
        <View
          style={{
            width: measure.scoreWidthPx,
            paddingTop: isStacked ? 0 : measure.px(MARGIN_TYPE.paddingPx),
          }}
        >
          <PlayingScore
            input={wall.score}
            size={isStacked ? 'page' : 'wall'}
            width={measure.scoreWidthPx}
            maxHeight={isStacked ? undefined : measure.scoreHeightPx - 2 * measure.px(MARGIN_TYPE.paddingPx)}
            accessibilityLabel={words.desk.scoreLabel(lesson.title)}
          />
        </View>
        <WallMargin
          lesson={lesson}
          rubrics={wall.rubrics}
          untold={wall.untold}
          hasSquare={hasSquare}
          groups={props.names ? wall.groups : null}
          names={props.names}
          measure={measure}
        />
      </View>
      <WallFooter
        prompt={view.stage.prompt}
        released={view.released}
        offered={wall.offered}
        here={Math.max(props.here, wall.offered)}
        ways={isWaysTold ? { answer: ways } : null}
        notice={props.notice}
        onLetSound={props.onLetSound}
        measure={measure}
      />
    </View>
  )
}
