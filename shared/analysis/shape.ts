import { readVoice, type SetAside } from '@/shared/rules/reading'
import type { Moment } from '@/shared/rules/rule'
import { recoveryOf, type Recovery } from '@/shared/theory/analyse-cantus'
import { findGestures, type Gesture } from '@/shared/theory/gestures'
import {
  directionFrom,
  intervalBetween,
  stepsFrom,
  type Direction,
  type Interval,
} from '@/shared/theory/interval'
import type { Line } from '@/shared/theory/note'
import { comparePitches, type Pitch } from '@/shared/theory/pitch'

/** Where a note stands. */
export type NotePlace = Readonly<{ bar: number; place: number }>

/** A leap of a third or more, and what the line does next. */
export type LineLeap = Readonly<{
  from: NotePlace & Readonly<{ pitch: Pitch }>
  to: NotePlace & Readonly<{ pitch: Pitch }>
  interval: Interval
  direction: Direction
  recovery: Recovery
}>

/** One voice as a melody. */
export type LineShape = Readonly<{
  lowest: Pitch
  highest: Pitch
  range: Interval
  /** Where the highest note sounds; one place, where the line has a single peak. */
  apexes: readonly NotePlace[]
  leaps: readonly LineLeap[]
  steps: number
  repeats: number
  /** Share of steps among the moves, 0 to 1; `null` where nothing moves. */
  stepShare: number | null
  /** Spans of three bars or more that the contour of the downbeats suggests; none where bars are unwritten. */
  gestures: readonly Gesture[]
}>

type Sounding = NotePlace & Readonly<{ pitch: Pitch }>

/**
 * The shape of a line of any species; a tied note counts once. Moves are counted between notes with nothing but rests
 * between them. `null` where no note is written.
 */
export function findShape(barCount: number, line: Line, setAside?: SetAside): LineShape | null {
  const moments = readVoice(barCount, line, setAside)
  const stretches = soundingStretches(moments)
  const notes = stretches.flat()
  const byHeight = notes.map(({ pitch }) => pitch).sort(comparePitches)
  const lowest = byHeight[0]
  const highest = byHeight.at(-1)
  if (lowest === undefined || highest === undefined) return null
  const sizes = stretches.flatMap((stretch) =>
    stretch
      .slice(1)
      .map(({ pitch }, index) => Math.abs(stepsFrom((stretch[index] as Sounding).pitch, pitch))),
  )
  const steps = sizes.filter((size) => size === 1).length
  const repeats = sizes.filter((size) => size === 0).length
  const moves = sizes.length - repeats
  return {
    lowest,
    highest,
    range: intervalBetween(lowest, highest),
    apexes: notes
      .filter(({ pitch }) => comparePitches(pitch, highest) === 0)
      .map(({ bar, place }) => ({ bar, place })),
    leaps: stretches.flatMap(leapsOf),
    steps,
    repeats,
    stepShare: moves === 0 ? null : steps / moves,
    gestures: moments.some(({ note }) => note === null) ? [] : gesturesOf(notes),
  }
}

function soundingStretches(moments: readonly Moment[]): readonly (readonly Sounding[])[] {
  const stretches: Sounding[][] = [[]]
  for (const { note, bar, place } of moments) {
    if (note === null) stretches.push([])
    else if (note !== 'rest') stretches.at(-1)?.push({ bar, place, pitch: note })
  }
  return stretches
}

const leapsOf = (stretch: readonly Sounding[]): readonly LineLeap[] =>
  stretch.slice(1).flatMap((to, index): readonly LineLeap[] => {
    const from = stretch[index] as Sounding
    const interval = intervalBetween(from.pitch, to.pitch)
    if (interval.steps < 2) return []
    const direction = directionFrom(from.pitch, to.pitch)
    return [
      { from, to, interval, direction, recovery: recoveryOf(to.pitch, stretch[index + 2]?.pitch, direction) },
    ]
  })

/** Gestures by the first note of each bar, in the numbers of the score. */
function gesturesOf(notes: readonly Sounding[]): readonly Gesture[] {
  const firsts = notes.filter(({ bar }, index) => bar !== notes[index - 1]?.bar)
  return findGestures(firsts.map(({ pitch }) => pitch)).map(({ from, to, shape }) => ({
    from: (firsts[from - 1] as Sounding).bar,
    to: (firsts[to - 1] as Sounding).bar,
    shape,
  }))
}
