import type { Moment } from '@/shared/rules/rule'
import type { PitchName } from '@/shared/theory/pitch'

/** One written note or rest of a choice, where it stands. A tied note's held part is an onset of its own. */
export type WrittenOnset = Readonly<{
  bar: number
  /** Ticks from the start of the bar. */
  place: number
  pitch: PitchName | null
  /** Written length, within the bar. */
  ticks: number
  isTied: boolean
  /** A pitch or a value that is tried only where it is already written. */
  isForeign: boolean
}>

/**
 * What may sound next at a place: one note or rest with its length, over the bar line where it is tied. Everything
 * rules will ask of its moments is known from the choice and its place alone.
 */
export type Choice = Readonly<{
  onsets: readonly WrittenOnset[]
  /** The moment rules of one voice see. */
  solo: Moment
  /** The moments rules of both voices see, one an onset. */
  pair: readonly Moment[]
  /** Index of the place at which the next choice is made. */
  next: number
}>

/**
 * A point of time at which the line chooses, in the order of time; paths that can go on alike meet in one place. The
 * choices stand in the order of solutions: rests first, pitches ascending, the longer note before the shorter.
 */
export type Place = Readonly<{ bar: number; place: number; choices: readonly Choice[] }>

/** All places of an exercise; the last is the end of the line, where nothing is left to choose. */
export type Places = readonly Place[]
