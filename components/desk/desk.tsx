import { useCallback, useDeferredValue, useMemo, useState } from 'react'
import { useWindowDimensions, View } from 'react-native'
import { lineWith } from '@/components/lesson/line-with'
import { PlayingScore } from '@/components/lesson/playing-score'
import { ScoreText } from '@/components/lesson/score-text'
import { speakScore } from '@/components/lesson/spoken'
import { useWholeWindow } from '@/components/lesson/use-whole-window'
import { usePlayer, useStopOnLeave } from '@/components/sound'
import { space, useTheme, useWidth } from '@/components/theme'
import { Txt, useTitle } from '@/components/ui'
import { useWords } from '@/components/words'
import type { BoardState, SheetState } from '@/shared/board'
import { DEFAULT_TEMPO } from '@/shared/playback'
import { formatPitch } from '@/shared/theory/pitch'
import { DeskFooter } from './desk-footer'
import { DeskHeader, type KeptState } from './desk-header'
import { DeskLadder } from './desk-ladder'
import { DeskRubric } from './desk-rubric'
import { DeskSettings } from './desk-settings'
import { SteadyHeight } from './steady-height'
import { useDesk, type SheetPen } from './use-desk'

/** Room for four whole lines; on a low screen, for three, then two. */
const RUBRIC_PX = 114
const MIDDLE_SCREEN_PX = 760
const MIDDLE_RUBRIC_PX = 91
/** Screens so low that the rungs need the room more. */
const LOW_SCREEN_PX = 640
const LOW_RUBRIC_PX = 68
const SIDE_PX = 400

export type DeskProps = Readonly<{
  title: string
  board: BoardState
  sheet: SheetState
  pen: SheetPen
  kept: KeptState
  here: number | null
  isOffline: boolean
  /** What hinders the server from keeping anything just now. */
  hindrance: 'database' | 'disk-full' | null
  /** The lesson has not been opened yet. */
  isPrepared: boolean
  isHandUp: boolean
  onHand: () => void
}>

const rubricHeightPx = (screenPx: number): number =>
  screenPx < LOW_SCREEN_PX ? LOW_RUBRIC_PX : screenPx < MIDDLE_SCREEN_PX ? MIDDLE_RUBRIC_PX : RUBRIC_PX

/** The student's desk: the score in a strip, the bar in hand, their own notes, what is said of them. */
export function Desk(props: DeskProps) {
  const { board, sheet, pen } = props
  const words = useWords()
  const { colors } = useTheme()
  useWholeWindow()
  useTitle(props.title)
  const { isWide } = useWidth()
  const { width: widthPx, height } = useWindowDimensions()
  const player = usePlayer()
  useStopOnLeave()
  const model = useDesk(board, sheet, pen)
  const [isSetting, setSetting] = useState(false)
  const { view, desk, hand, pitches, take } = model

  const read = useMemo(() => lineWith(view.line, desk.own), [view, desk])
  // Read, not looked at: it may come after the picture.
  const later = useDeferredValue(desk)
  const sentences = useMemo(
    () => speakScore(view, lineWith(view.line, later.own), later.findings, words),
    [view, later, words],
  )
  const { play, strike } = player
  const hear = useCallback(() => {
    const { cantus } = view.written
    const released = view.released
    play({
      score: { cantus, line: read, setAside: [...view.setAside] },
      voices: 'both',
      // The work in its surroundings: the open bars with one on either side, or all of it where none is open.
      fromBar: released.length > 0 ? Math.max(1, (released[0] ?? 1) - 1) : 1,
      toBar: released.length > 0 ? Math.min(view.barCount, (released.at(-1) ?? 1) + 1) : view.barCount,
      tempo: DEFAULT_TEMPO,
    })
  }, [view, read, play])
  const hearRung = useCallback(
    (index: number) => {
      const pitch = pitches[index]
      if (pitch) strike(formatPitch(pitch))
    },
    [pitches, strike],
  )
  const isBarOpen = useCallback((bar: number) => desk.bars[bar - 1]?.kind === 'open', [desk])
  const pressStaff = useCallback(
    (bar: number, pitch: string) => {
      take(bar)
      model.propose(bar, pitch)
    },
    // eslint-disable-next-line react-hooks/exhaustive-deps -- the model's other parts do not matter to a press
    [take, model.propose],
  )

  const score = (
    <PlayingScore
      input={model.score}
      size={isWide ? 'page' : 'strip'}
      width={isWide ? widthPx - SIDE_PX - 2 * space.double : widthPx}
      handBar={hand}
      onPressBar={take}
      onPressStaff={isWide ? pressStaff : undefined}
      isBarOpen={isBarOpen}
      accessibilityLabel={words.desk.scoreLabel(props.title)}
    />
  )
  const notices = [
    props.isPrepared ? words.desk.prepared : null,
    props.hindrance ? words.lesson.hindrance[props.hindrance] : null,
    props.isOffline ? words.lesson.connection.offline : null,
    player.problem,
  ].filter((notice) => notice !== null)
  const rubric = (
    <DeskRubric
      notices={notices}
      findings={desk.findings}
      hand={hand}
      released={view.released}
      hasWritten={Object.keys(desk.own).length > 0}
      prompt={view.stage.prompt}
      heightPx={isWide ? null : rubricHeightPx(height)}
    />
  )
  const ladder = <DeskLadder model={model} onHearRung={hearRung} onSettings={() => setSetting(true)} />
  const footer = (
    <DeskFooter
      before={model.before}
      after={model.after}
      isPlaying={player.isPlaying}
      isLoading={player.isLoading}
      canHear
      isHandUp={props.isHandUp}
      canRaiseHand={!props.isOffline}
      onHear={hear}
      onStop={player.stop}
      onStep={model.step}
      onHand={props.onHand}
    />
  )

  return (
    <View role="main" id="page" style={{ height: (isWide ? '100dvh' : 'max(100dvh, 640px)') as never }}>
      <DeskHeader released={view.released} kept={props.kept} here={props.here} />
      <ScoreText title={words.desk.textTitle} sentences={sentences} />
      {isWide ? (
        <View style={{ flex: 1, flexDirection: 'row', minHeight: 0 }}>
          <View style={{ flex: 1, minWidth: 0, overflow: 'auto' as never }}>
            <View style={{ paddingHorizontal: space.double, paddingVertical: space.wide, gap: space.one }}>
              <Txt kind="note" tone="lead">
                {props.title}
              </Txt>
              {score}
            </View>
            {rubric}
          </View>
          <View style={{ width: SIDE_PX, borderLeftWidth: 1, borderColor: colors.hairline }}>
            {ladder}
            {footer}
          </View>
        </View>
      ) : (
        <>
          <View style={{ paddingTop: space.small }}>
            <SteadyHeight>{score}</SteadyHeight>
          </View>
          {rubric}
          {ladder}
          {footer}
        </>
      )}
      <DeskSettings
        isOpen={isSetting}
        onClose={() => setSetting(false)}
        naming={model.naming}
        onNaming={model.setNaming}
        isChromatic={model.isChromatic}
        onChromatic={model.setChromatic}
      />
    </View>
  )
}
