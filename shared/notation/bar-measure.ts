import { cantusContent, EMPTY_CONTENT, lineContent, type StaffContent } from '@/shared/notation/bar-content'
import { spaceMoments, type Moments } from '@/shared/notation/bar-moments'
import { BRAVURA, ENGRAVING_DEFAULTS } from '@/shared/notation/bravura'
import { measureTextPx } from '@/shared/notation/measure-text'
import { isMeasured, isTiedOver } from '@/shared/notation/reading'
import type { ScoreBar, ScoreInput, Tone } from '@/shared/notation/score-input'
import type { ScoreLayoutOptions, Voice } from '@/shared/notation/score-layout'
import { figurePxOf, letteringOf, SIZE_FACTS } from '@/shared/notation/sizes'

/** Distances of the rail and the bars, in staff spaces. */
export const MOTION_HALF_STAFF_SPACES = 0.72
const MOTION_GAP = 0.35
const BAR_PADDING = 0.7
const MINI_BAR_PADDING = 0.5
const FOLD_WIDTH = 1.9
const MOST_ASKED_FOR_LABEL = 5

/** Width of the closing double bar with its clearance, in staff spaces. */
export const CLOSING_WIDTH_STAFF_SPACES =
  ENGRAVING_DEFAULTS.thinBarlineThickness +
  ENGRAVING_DEFAULTS.barlineSeparation +
  ENGRAVING_DEFAULTS.thickBarlineThickness

/** A bar before it has a place: what it holds on each staff, and the room it needs around its axis. */
export type MeasuredBar = Readonly<{
  bar: ScoreBar
  content: Readonly<Record<Voice, StaffContent>>
  isFolded: boolean
  /** The motion into the bar stands inside it, as what precedes it is folded. */
  isMotionInside: boolean
  leftPx: number
  rightPx: number
  /** The least width in whole px, and the share of spare width it asks for. */
  leastPx: number
  weight: number
  /** What hangs on the notes at their left, such as an accidental. */
  hangingPx: number
  endPx: number
  extraPx: number
  /** The moments of both staves, from the axis. */
  moments: Moments
  /** In a measured score notes begin at the left of their bar, and spread over it. */
  isMeasured: boolean
}>

/** How much wider a bar of several notes stands while it is in play. */
const RELEASED_SHARE = 1.15
const NO_MOMENTS: Moments = { ticks: [], leastXs: [], shares: [], idealStaffSpaces: 0 }

export function measureBars(
  input: ScoreInput,
  options: ScoreLayoutOptions,
  spacePx: number,
): readonly MeasuredBar[] {
  const { clefs, signature, bars } = input
  const { weights } = SIZE_FACTS[options.size]
  const lettering = letteringOf(spacePx)
  const isMini = options.size === 'mini'
  const paddingPx = (isMini ? MINI_BAR_PADDING : BAR_PADDING) * spacePx
  const hasRail = clefs.line !== null && !isMini
  const isFlowing = isMeasured(input)

  return bars.map((bar, i) => {
    const isFolded = bar.isSetAside && !isMini
    const numberPx = isMini ? 0 : measureTextPx(String(bar.number), 'Alegreya', lettering.numberPx)
    if (isFolded) {
      const content = { cantus: EMPTY_CONTENT, line: EMPTY_CONTENT }
      const leastPx = Math.ceil(Math.max(FOLD_WIDTH * spacePx, numberPx + 0.6 * spacePx))
      const half = leastPx / 2
      return {
        bar,
        content,
        isFolded,
        isMotionInside: false,
        leftPx: half,
        rightPx: half,
        leastPx,
        weight: 0,
        hangingPx: 0,
        endPx: 0,
        extraPx: 0,
        moments: NO_MOMENTS,
        isMeasured: isFlowing,
      }
    }
    const setting = clefs.line ? { clef: clefs.line, spacePx } : null
    const content = {
      cantus:
        isMini && clefs.line ? EMPTY_CONTENT : cantusContent(bar, signature, { clef: clefs.cantus, spacePx }),
      line: setting
        ? lineContent(bar, {
            signature,
            setting,
            isMeasured: isFlowing,
            isHeldInto: isTiedOver(bars[i - 1], bar),
            isTiedOver: isTiedOver(bar, bars[i + 1]),
          })
        : EMPTY_CONTENT,
    }
    const before = bars[i - 1]
    const isMotionInside = hasRail && bar.motion !== null && before !== undefined && before.isSetAside
    const figures = hasRail ? figuresOf(bar) : []
    const halves = figures.map(({ tick, text, isWeak }) => {
      return { tick, half: measureTextPx(text, 'Alegreya', figurePxOf(spacePx, isWeak)) / 2 }
    })
    const moments = spaceMoments([content.cantus.columns, content.line.columns], halves, spacePx)
    const xOf = (tick: number): number => moments.leastXs[moments.ticks.indexOf(tick)] ?? 0
    const motionPx = (MOTION_HALF_STAFF_SPACES + MOTION_GAP) * spacePx
    const figureLeft = Math.max(0, ...halves.map(({ tick, half }) => half - xOf(tick)))
    const figureRight = Math.max(0, ...halves.map(({ tick, half }) => half + xOf(tick)))
    const railLeft = hasRail ? figureLeft + (isMotionInside ? 2 : 1) * motionPx : 0
    const railRight = hasRail ? figureRight + motionPx : 0
    const columns = [...content.cantus.columns, ...content.line.columns]
    const half = (BRAVURA.noteheadWhole.right / 2) * spacePx
    const accidentals = columns.flatMap(({ marks }) => marks.filter(({ role }) => role === 'accidental'))
    // Proposals are centred as a bunch, with what hangs on them; measured bars have room for it among their notes.
    const hangingPx =
      isFlowing || bar.proposals.length > 0
        ? 0
        : Math.max(0, ...accidentals.map(({ box }) => -box.left - half))
    const endPx = i === bars.length - 1 && !isMini ? CLOSING_WIDTH_STAFF_SPACES * spacePx : 0
    const leftPx = Math.max(railLeft, ...columns.map(({ tick, box }) => paddingPx - box.left - xOf(tick)))
    const rightPx =
      Math.max(railRight, ...columns.map(({ tick, box }) => paddingPx + box.right + xOf(tick))) + endPx
    const labelPx =
      bar.label === null || isMini
        ? 0
        : Math.min(
            MOST_ASKED_FOR_LABEL * spacePx,
            measureTextPx(bar.label, 'AlegreyaSans', lettering.labelPx),
          )
    const isInHand = options.size === 'strip' && bar.number === options.handBar
    const ideal = moments.idealStaffSpaces * (bar.state === 'released' ? RELEASED_SHARE : 1)
    return {
      bar,
      content,
      isFolded,
      isMotionInside,
      leftPx,
      rightPx,
      leastPx: Math.ceil(
        Math.max(leftPx + rightPx, isMini ? 0 : numberPx + 1.2 * spacePx, labelPx + 0.8 * spacePx + endPx),
      ),
      weight: Math.max(weights[bar.state], isMini ? 0 : ideal) * (isInHand ? 1.15 : 1),
      hangingPx,
      endPx,
      extraPx: hangingPx + endPx,
      moments,
      isMeasured: isFlowing,
    }
  })
}

/** The figures of a bar's rail, from left to right; those after the downbeat are smaller. */
export const figuresOf = (
  bar: ScoreBar,
): readonly Readonly<{ tick: number; text: string; tone: Tone; isWeak: boolean }>[] => [
  ...(bar.figure ? [{ ...bar.figure, tick: 0, isWeak: false }] : []),
  ...(bar.laterFigures ?? []).map((figure) => ({ ...figure, isWeak: true })),
]
