import { measureBars, type MeasuredBar } from '@/shared/notation/bar-measure'
import { isMeasured } from '@/shared/notation/reading'
import type { ScoreInput } from '@/shared/notation/score-input'
import type { ScoreLayoutOptions, Voice } from '@/shared/notation/score-layout'
import { metreWidthPx, prefixWidthPx } from '@/shared/notation/system-marks'
import type { Clef } from '@/shared/theory/clef'

type Staff = Readonly<{ voice: Voice; clef: Clef }>

function stavesOf({ position, clefs }: ScoreInput, isMini: boolean): readonly Staff[] {
  const cantus: Staff = { voice: 'cantus', clef: clefs.cantus }
  if (clefs.line === null) return [cantus]
  const line: Staff = { voice: 'line', clef: clefs.line }
  if (isMini) return [line]
  return position === 'above' ? [line, cantus] : [cantus, line]
}

/** Everything about a layout that is settled before the first mark is placed. */
export type Setting = Readonly<{
  input: ScoreInput
  options: ScoreLayoutOptions
  spacePx: number
  staves: readonly Staff[]
  prefixPx: number
  /** What the sign of the metre adds to the prefix of the first system; 0 without one. */
  metrePx: number
  measured: readonly MeasuredBar[]
}>

/** A few bars of a proposal are read beside their score; a cantus by itself needs its clef. */
export const hasClefs = ({ clefs }: ScoreInput, { size }: ScoreLayoutOptions): boolean =>
  size !== 'mini' || clefs.line === null

/** Measured notes go by halves, as the first system says once: cut time, for a bar of one whole note. */
export const hasMetre = (input: ScoreInput, options: ScoreLayoutOptions): boolean =>
  hasClefs(input, options) && isMeasured(input)

export function settingAt(input: ScoreInput, options: ScoreLayoutOptions, spacePx: number): Setting {
  const isMini = options.size === 'mini'
  const staves = stavesOf(input, isMini)
  const clefs = staves.map(({ clef }) => clef)
  const prefixPx = hasClefs(input, options) ? prefixWidthPx(clefs, input.signature, spacePx) : 0
  const metrePx = hasMetre(input, options) ? metreWidthPx(spacePx) : 0
  return {
    input,
    options,
    spacePx,
    staves,
    prefixPx,
    metrePx,
    measured: measureBars(input, options, spacePx),
  }
}

/** The width a bar asks for before any stretching. */
export const naturalPx = (bar: MeasuredBar, spacePx: number): number =>
  Math.max(bar.leastPx, bar.extraPx + bar.weight * spacePx)
