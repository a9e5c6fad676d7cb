import type { BoardState } from '@/shared/board'
import { createChecker, readExercise, type Checker, type Exercise } from '@/shared/rules'
import type { Line } from '@/shared/theory/note'
import type { BarState, BoardExercise, Gesture, StageSettings } from '@/shared/wire/documents'

/** A board as the three faces read it. */
export type LessonView = Readonly<{
  written: BoardExercise
  exercise: Exercise
  checker: Checker
  barCount: number
  /** By 1-based bar number. */
  bars: Readonly<Record<number, BarState>>
  line: Line
  setAside: ReadonlySet<number>
  /** Bars in which notes may be proposed: released and not set aside. */
  released: readonly number[]
  gestures: readonly Gesture[]
  stage: StageSettings
}>

type Prepared = Readonly<{ exercise: Exercise; checker: Checker }>

/** A board hands out the same exercise until it is changed, so its rules are started once. */
const prepared = new WeakMap<BoardExercise, Prepared>()

function prepare(written: BoardExercise): Prepared {
  const known = prepared.get(written)
  if (known) return known
  const exercise = readExercise(written)
  const made = { exercise, checker: createChecker(exercise, written.ruleSet) }
  prepared.set(written, made)
  return made
}

export function viewOf(board: BoardState): LessonView {
  const numbered = Object.entries(board.bars).map(([bar, state]) => ({ ...state, number: Number(bar) }))
  return {
    ...prepare(board.exercise),
    written: board.exercise,
    barCount: board.exercise.cantus.length,
    bars: board.bars,
    line: board.line,
    setAside: new Set(numbered.filter(({ setAside }) => setAside).map(({ number }) => number)),
    released: numbered
      .filter(({ state, setAside }) => state === 'released' && !setAside)
      .map(({ number }) => number)
      .sort((a, b) => a - b),
    gestures: Object.values(board.gestures).sort((a, b) => a.from - b.from || a.to - b.to),
    stage: board.stage,
  }
}
