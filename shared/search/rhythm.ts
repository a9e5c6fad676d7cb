import type { Species } from '@/shared/rules/rule'
import { QUARTER_TICKS, WHOLE_TICKS } from '@/shared/theory/duration'
import type { BarNotes } from '@/shared/theory/note'

/** One value of a bar, sounding or silent. */
export type Value = Readonly<{ ticks: number; isRest: boolean }>

/** A way to fill a bar with values, without pitches. */
export type BarRhythm = Readonly<{
  values: readonly Value[]
  /** Whether its first note is held over from the bar before. */
  tieIn: boolean
  /** Whether its last note is held into the next bar. */
  tieOut: boolean
  /** Not of the species: only there because it has been written, and only where it has. */
  isForeign: boolean
}>

const HALF = 2 * QUARTER_TICKS
const EIGHTH = QUARTER_TICKS / 2

const note = (ticks: number): Value => ({ ticks, isRest: false })
const rest = (ticks: number): Value => ({ ticks, isRest: true })
const rhythm = (...values: readonly Value[]): BarRhythm => ({
  values,
  tieIn: false,
  tieOut: false,
  isForeign: false,
})

const WHOLE = rhythm(note(WHOLE_TICKS))
const HALVES = rhythm(note(HALF), note(HALF))
const REST_AND_HALF = rhythm(rest(HALF), note(HALF))
const Q = note(QUARTER_TICKS)
const QUARTERS = rhythm(Q, Q, Q, Q)
const REST_AND_QUARTERS = rhythm(rest(QUARTER_TICKS), Q, Q, Q)

/** A rhythm as it stands, and with its last note held over. */
const tiedOrNot = (plain: BarRhythm): readonly BarRhythm[] => [plain, { ...plain, tieOut: true }]
const heldOrNot = (plain: BarRhythm): readonly BarRhythm[] => [plain, { ...plain, tieIn: true }]

/** Where a bar stands among those that are read. */
type Standing = Readonly<{ isFirst: boolean; isPenultimate: boolean; isLast: boolean }>

/**
 * The rhythms a species may write in a bar, as wide as any school has them: the laws say which of them stand. Fifth
 * species mixes wholes, dotted halves, halves, quarters and pairs of eighths on the second and fourth quarter; halves
 * and longer notes are tied into a half or a quarter.
 */
export function rhythmsOf(species: Species, standing: Standing): readonly BarRhythm[] {
  const { isFirst, isLast } = standing
  if (isLast) return species >= 4 ? heldOrNot(WHOLE) : [WHOLE]
  switch (species) {
    case 1:
      return [WHOLE]
    case 2:
      return [HALVES, ...(isFirst ? [REST_AND_HALF] : []), ...(standing.isPenultimate ? [WHOLE] : [])]
    case 3:
      return isFirst ? [QUARTERS, REST_AND_QUARTERS] : [QUARTERS]
    case 4:
      return isFirst
        ? [...tiedOrNot(HALVES), ...tiedOrNot(REST_AND_HALF)]
        : heldOrNot(HALVES).flatMap(tiedOrNot)
    case 5:
      return isFirst ? [...FLORID_OPENINGS, ...FLORID.filter(({ tieIn }) => !tieIn)] : FLORID
  }
}

/** Lengths of notes in fifth species, and where in the bar each may begin. */
const FLORID_PLACES: readonly Readonly<{ ticks: number; places: readonly number[] }>[] = [
  { ticks: WHOLE_TICKS, places: [0] },
  { ticks: HALF + QUARTER_TICKS, places: [0] },
  { ticks: HALF, places: [0, QUARTER_TICKS, HALF] },
  { ticks: QUARTER_TICKS, places: [0, QUARTER_TICKS, HALF, HALF + QUARTER_TICKS] },
]
const EIGHTH_PAIR_PLACES: readonly number[] = [QUARTER_TICKS, HALF + QUARTER_TICKS]

/** All rows of values from a place in the bar to its end. */
function rowsFrom(place: number): readonly (readonly Value[])[] {
  if (place === WHOLE_TICKS) return [[]]
  const rows: (readonly Value[])[] = []
  for (const { ticks, places } of FLORID_PLACES) {
    if (!places.includes(place) || place + ticks > WHOLE_TICKS) continue
    for (const row of rowsFrom(place + ticks)) rows.push([note(ticks), ...row])
  }
  if (EIGHTH_PAIR_PLACES.includes(place)) {
    for (const row of rowsFrom(place + QUARTER_TICKS)) rows.push([note(EIGHTH), note(EIGHTH), ...row])
  }
  return rows
}

/** Ties leave from halves and longer notes, and arrive at halves and quarters. */
function withTies(values: readonly Value[]): readonly BarRhythm[] {
  const first = values[0] as Value
  const last = values.at(-1) as Value
  const ways =
    first.ticks === HALF || first.ticks === QUARTER_TICKS ? heldOrNot(rhythm(...values)) : [rhythm(...values)]
  const isLong = last.ticks >= HALF
  return ways.flatMap((way) => (isLong && !(way.tieIn && values.length === 1) ? tiedOrNot(way) : [way]))
}

const FLORID: readonly BarRhythm[] = rowsFrom(0).flatMap(withTies)
/** A half rest first, then the second half of a bar. */
const FLORID_OPENINGS: readonly BarRhythm[] = rowsFrom(HALF)
  .map((row) => rhythm(rest(HALF), ...row))
  .flatMap((opening) => ((opening.values.at(-1) as Value).ticks >= HALF ? tiedOrNot(opening) : [opening]))

/** What has been written in a bar, as a rhythm that is allowed there and nowhere else. */
export const writtenRhythms = (notes: BarNotes): readonly BarRhythm[] => {
  const values = notes.map(({ pitch, ticks }) => ({ ticks, isRest: pitch === null }))
  const tieOut = notes.at(-1)?.tied === true
  return heldOrNot({ values, tieIn: false, tieOut, isForeign: true })
}
