import { momentOf } from '@/shared/rules/reading'
import type { Exercise, Sounding } from '@/shared/rules/rule'
import type { Choice, Place, Places, WrittenOnset } from '@/shared/search/place'
import type { BarRhythm } from '@/shared/search/rhythm'
import { createPoints, type Point, type Stride } from '@/shared/search/strides'
import { comparePitches, formatPitch, type Pitch } from '@/shared/theory/pitch'

/** A pitch that is tried in a bar; a foreign one only where it is written. */
export type Tried = Readonly<{ pitch: Pitch; isForeign: boolean }>

/**
 * The places of an exercise: every point of time at which the rhythms of its bars let the line choose, with every
 * pitch that is tried there. `bars` are those that are read, 1-based.
 */
export function createPlaces(
  exercise: Exercise,
  bars: readonly number[],
  rhythmsAt: (barIndex: number) => readonly BarRhythm[],
  triedIn: (bar: number) => readonly Tried[],
): Places {
  const isNeighbour = (barIndex: number): boolean => bars[barIndex + 1] === (bars[barIndex] as number) + 1
  const points = createPoints(bars.length, rhythmsAt, isNeighbour)
  const indexOf = new Map(points.map((point, index) => [point, index]))
  const lastBar = bars.length - 1

  /** How many onsets follow a point to the end, as far as the last onset but one needs it. */
  const onsetsAfter = ({ barIndex, left }: Point): number =>
    barIndex > lastBar ? 0 : barIndex === lastBar ? left : Infinity

  const choicesOf = (stride: Stride, isFirst: boolean): readonly Choice[] => {
    const next = indexOf.get(stride.next) as number
    const after = onsetsAfter(stride.next)
    const bar = bars[stride.parts[0]?.barIndex as number] as number
    if (stride.isRest) return [choiceOf(exercise, bars, stride, null, next, after, isFirst)]
    return triedIn(bar).map((tried) => choiceOf(exercise, bars, stride, tried, next, after, isFirst))
  }

  return points.map((point, index): Place => {
    const bar = bars[point.barIndex] ?? (bars.at(-1) ?? 0) + 1
    const choices = point.strides.flatMap((stride) => choicesOf(stride, index === 0))
    return { bar, place: point.place, choices: choices.sort(compareChoices) }
  })
}

function choiceOf(
  { cantus }: Exercise,
  bars: readonly number[],
  { parts }: Stride,
  tried: Tried | null,
  next: number,
  after: number,
  isFirst: boolean,
): Choice {
  const note: Sounding = tried === null ? 'rest' : tried.pitch
  const pitch = tried === null ? null : formatPitch(tried.pitch)
  const onsets = parts.map(({ barIndex, place, ticks, isTied, isForeign }, turn): WrittenOnset => {
    const bar = bars[barIndex] as number
    const isStranger = isForeign || (turn === 0 && tried?.isForeign === true)
    return { bar, place, pitch, ticks, isTied, isForeign: isStranger }
  })
  let sounding = 0
  const pair = onsets
    .map(({ bar, place, ticks }, turn) => ({ bar, place, ticks, turn }))
    .reverse()
    .map(({ bar, place, ticks, turn }) => {
      sounding += ticks
      const onset = { bar, place, note, isHeld: turn > 0 }
      // Where an onset stands among all is not known here; only the first place is asked for.
      const index = isFirst && turn === 0 ? 0 : 1
      const following = after + onsets.length - 1 - turn
      return momentOf(onset, cantus[bar - 1] as Pitch, sounding, index, following === 1, following === 0)
    })
    .reverse()
  const { bar, place } = onsets[0] as WrittenOnset
  const struck = { bar, place, note, isHeld: false }
  return {
    onsets,
    solo: momentOf(struck, null, sounding, isFirst ? 0 : 1, after === 1, after === 0),
    pair,
    next,
  }
}

function compareChoices(a: Choice, b: Choice): number {
  const [first, second] = [a.solo.note, b.solo.note]
  if (first === 'rest' || second === 'rest' || first === null || second === null) {
    return Number(second === 'rest') - Number(first === 'rest') || b.solo.ticks - a.solo.ticks
  }
  const [here, there] = [a.onsets[0] as WrittenOnset, b.onsets[0] as WrittenOnset]
  return (
    comparePitches(first, second) ||
    there.ticks - here.ticks ||
    Number(here.isTied) - Number(there.isTied) ||
    b.solo.ticks - a.solo.ticks
  )
}
