import type { RuleSet } from '@/shared/rules'
import type { WrittenExercise } from '@/shared/rules/exercise'
import type { DeadEnd } from '@/shared/search'
import type { Line } from '@/shared/theory/note'
import type { PitchName } from '@/shared/theory/pitch'

/** One line to be finished. `key` names it in the answer. */
export type WaysQuestion = Readonly<{
  key: string
  line: Line
  /** The bar for which each note that still leads to an end is wanted, with how many ways it has. */
  aliveInBar?: number | undefined
}>

/** What a screen wants to know of one state of the score. A later request puts an earlier one aside. */
export type WaysRequest = Readonly<{
  number: number
  exercise: WrittenExercise
  ruleSet: RuleSet
  setAside: readonly number[]
  questions: readonly WaysQuestion[]
}>

/** How many ways there are to finish a line. Counts are whole numbers as text: they may pass what a number holds. */
export type WaysAnswer = Readonly<{
  count: string
  /** False when the counting was cut short: there are at least so many. */
  isExact: boolean
  deadEnd: DeadEnd | null
  /** By pitch, of the bar that was asked about; first note of the bar. */
  alive: Readonly<Record<PitchName, string>> | null
}>

export type WaysReply = Readonly<{ number: number; key: string; answer: WaysAnswer }>
