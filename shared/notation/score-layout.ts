import type { Box } from '@/shared/notation/box'
import type { Mark } from '@/shared/notation/mark'
import type { Clef } from '@/shared/theory/clef'

/**
 * Where a score is read. `wall` fills the width, large; `page` breaks into systems; `strip` is one long system of which
 * a window shows; `mini` is a few bars of one bare staff (with its clef when
 * it is a cantus by itself).
 */
export type ScoreSize = 'wall' | 'page' | 'strip' | 'mini'

export type ScoreLayoutOptions = Readonly<{
  size: ScoreSize
  widthPx: number
  /** On the wall and a page: the staff space shrinks, within reason, to keep to this height. */
  maxHeightPx?: number | undefined
  /** The bar being worked on, by number: a little wider on a strip. */
  handBar?: number | undefined
}>

export type Voice = 'cantus' | 'line'

export type StaffLayout = Readonly<{ voice: Voice; clef: Clef; topPx: number }>

/** A bar's place in its system. */
export type BarFrame = Readonly<{
  /** Place in the input's list of bars, and the bar's written number. */
  index: number
  number: number
  isFolded: boolean
  /** From the left edge of its system. */
  xPx: number
  widthPx: number
  /** Where its first notes stand, from its own left edge. */
  axisPx: number
  /** Where each of its moments stands, from its own left edge, by its place in ticks. */
  moments: readonly Readonly<{ tick: number; xPx: number }>[]
}>

/** One bar. Its marks are placed from its own left edge, so that a bar which only moves is the same drawing. */
export type BarLayout = BarFrame & Readonly<{ marks: readonly Mark[] }>

/** One line of music. Every place inside it is measured from its own top left corner. */
export type SystemLayout = Readonly<{
  xPx: number
  yPx: number
  widthPx: number
  heightPx: number
  /** Where the first bar begins: after the clefs and the signature. */
  prefixPx: number
  staves: readonly StaffLayout[]
  /** Top of the upper staff to the foot of the lower. */
  stavesBox: Box
  /** Middle of the rail between the staves; null with a single staff. */
  railPx: number | null
  staffLines: readonly Mark[]
  prefix: readonly Mark[]
  /** What spans bars: arcs, brackets, the bar line that ends the system. */
  spans: readonly Mark[]
  bars: readonly BarLayout[]
}>

export type ScoreLayout = Readonly<{
  size: ScoreSize
  widthPx: number
  heightPx: number
  spacePx: number
  signature: number
  /** The voice a click on the staff writes: the line, or the cantus where it stands alone. */
  pressedVoice: Voice
  systems: readonly SystemLayout[]
}>
