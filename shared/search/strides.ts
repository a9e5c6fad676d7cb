/** Rhythms of bars as one net: points of time, and the strides of one note or rest between them. */
import { WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarRhythm, Value } from '@/shared/search/rhythm'

/** Part of a stride in one bar: a note, a rest, or what is held of a note. */
export type Part = Readonly<{
  barIndex: number
  place: number
  ticks: number
  isForeign: boolean
  isTied: boolean
}>

/** One note or rest between two points. */
export type Stride = Readonly<{ isRest: boolean; parts: readonly Part[]; next: Point }>

/** A point of time with what may still fill its bar; points from which all goes on alike are one. */
export type Point = {
  readonly barIndex: number
  readonly place: number
  /** How many notes or rests are left in the bar, in every way to go on. Told for the last bar only. */
  readonly left: number
  strides: readonly Stride[]
}

type Rest = Readonly<{ values: readonly Value[]; tieOut: boolean; isForeign: boolean }>
type RhythmsAt = (barIndex: number) => readonly BarRhythm[]

/**
 * Makes the net. `isNeighbour` says whether a bar is directly followed by the next one that is read: only then can a
 * note be held into it. The first point comes first, the end last, time ascending.
 */
export function createPoints(
  barCount: number,
  rhythmsAt: RhythmsAt,
  isNeighbour: (barIndex: number) => boolean,
): readonly Point[] {
  const known = new Map<string, Point>()
  const end: Point = { barIndex: barCount, place: 0, left: 0, strides: [] }

  const pointOf = (barIndex: number, place: number, rests: readonly Rest[]): Point => {
    const name = `${barIndex} ${place} ${rests.map(nameOf).sort().join(' | ')}`
    const before = known.get(name)
    if (before) return before
    const point: Point = { barIndex, place, left: rests[0]?.values.length ?? 0, strides: [] }
    known.set(name, point)
    point.strides = byFirst(rests).flatMap((group) => stridesOf(barIndex, place, group))
    return point
  }

  const begin = (barIndex: number, tieIn: boolean): readonly Rest[] =>
    dropForeignTwins(rhythmsAt(barIndex).filter((rhythm) => rhythm.tieIn === tieIn))

  /** What goes on from a group of ways that begin alike, with the parts a tie adds. */
  const stridesOf = (barIndex: number, place: number, group: Group): readonly Stride[] => {
    const { value, isTied, isForeign, tails } = group
    const part: Part = { barIndex, place, ticks: value.ticks, isForeign, isTied }
    if (!isTied) {
      const isBarOver = tails.every(({ values }) => values.length === 0)
      const nextBar = barIndex + 1
      const next = !isBarOver
        ? pointOf(barIndex, place + value.ticks, tails)
        : nextBar === barCount
          ? end
          : pointOf(nextBar, 0, begin(nextBar, false))
      return [{ isRest: value.isRest, parts: [part], next }]
    }
    if (!isNeighbour(barIndex)) return []
    return byFirst(begin(barIndex + 1, true))
      .flatMap((held) => stridesOf(barIndex + 1, 0, held))
      .map(({ parts, next }) => ({ isRest: false, parts: [part, ...parts], next }))
  }

  pointOf(0, 0, begin(0, false))
  return [...known.values(), end].sort((a, b) => timeOf(a) - timeOf(b))
}

const timeOf = ({ barIndex, place }: Point): number => 2 * barIndex * WHOLE_TICKS + place

const nameOf = ({ values, tieOut, isForeign }: Rest): string =>
  `${values.map(({ ticks, isRest }) => `${isRest ? 'r' : ''}${ticks}`).join()}${tieOut ? '~' : ''}${isForeign ? '!' : ''}`

/** Ways to go on that begin with the same note or rest. */
type Group = Readonly<{ value: Value; isTied: boolean; isForeign: boolean; tails: readonly Rest[] }>

function byFirst(rests: readonly Rest[]): readonly Group[] {
  const groups = new Map<string, { value: Value; isTied: boolean; rests: Rest[] }>()
  for (const rest of rests) {
    const value = rest.values[0]
    if (value === undefined) continue
    const isLast = rest.values.length === 1
    const isTied = isLast && rest.tieOut && !value.isRest
    const name = `${value.ticks} ${value.isRest} ${isTied} ${isLast}`
    const group = groups.get(name) ?? { value, isTied, rests: [] }
    group.rests.push(rest)
    groups.set(name, group)
  }
  return [...groups.values()].map(({ value, isTied, rests: alike }) => ({
    value,
    isTied,
    isForeign: alike.every(({ isForeign }) => isForeign),
    tails: dropForeignTwins(alike.map((rest) => ({ ...rest, values: rest.values.slice(1) }))),
  }))
}

/** A written rhythm that the species has anyway is no stranger. */
function dropForeignTwins(rests: readonly Rest[]): readonly Rest[] {
  const own = new Set(rests.filter(({ isForeign }) => !isForeign).map(nameOf))
  const seen = new Set<string>()
  return rests.filter((rest) => {
    const name = nameOf(rest)
    if (seen.has(name) || (rest.isForeign && own.has(name.replace('!', '')))) return false
    seen.add(name)
    return true
  })
}
