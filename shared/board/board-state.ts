import type { BarNotes } from '@/shared/theory/note'
import type {
  BarState,
  BoardExercise,
  ChorusProposal,
  Gesture,
  Mark,
  SheetBar,
  Spread,
  StageSettings,
} from '@/shared/wire/documents'

/** The board as plain values, every bar of the cantus present. */
export type BoardState = Readonly<{
  exercise: BoardExercise
  /** By 1-based bar number, one for each note of the cantus. */
  bars: Readonly<Record<number, BarState>>
  /** What the class agreed on; a bar that is missing is unwritten. */
  line: Readonly<Record<number, BarNotes>>
  gestures: Readonly<Record<string, Gesture>>
  stage: StageSettings
  /** The room's proposals without names; empty unless the stage shows them. */
  spread: Readonly<Record<number, Spread>>
}>

/** One member's sheet as plain values. */
export type SheetState = Readonly<{
  notes: Readonly<Record<number, SheetBar>>
  marks: readonly Mark[]
}>

/** Every standing proposal: by bar, then by member. */
export type ChorusState = Readonly<Record<number, Readonly<Record<string, ChorusProposal>>>>

/** A bar of which nothing has been written yet. */
export const INITIAL_BAR: BarState = { state: 'frozen', setAside: false, round: 1 }

export const INITIAL_STAGE: StageSettings = {
  prompt: '',
  showsFindings: true,
  showsSpread: false,
  showsNames: false,
  showsWays: 'nobody',
}

/** Bar numbers of an exercise, from 1. */
export const barsOf = (exercise: BoardExercise): readonly number[] =>
  exercise.cantus.map((_, index) => index + 1)

/** A board on which nothing has happened: every bar frozen, no line. */
export function createBoardState(exercise: BoardExercise, stage: StageSettings): BoardState {
  const bars = Object.fromEntries(barsOf(exercise).map((bar) => [bar, INITIAL_BAR]))
  return { exercise, bars, line: {}, gestures: {}, stage, spread: {} }
}
