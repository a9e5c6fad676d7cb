import { depthStaffSpaces } from '@/shared/notation/staff-place'
import { QUARTER_TICKS } from '@/shared/theory/duration'
import type { WrittenValue } from '@/shared/theory/note-value'

/*
 * Stems and beams as Gould, Behind Bars, has them (from memory): an octave of stem, up from below the middle line and
 * down from it and above; out of ledger lines at least to the middle line; a beam takes the direction of the note
 * farthest from the middle, slants by no more than a space, and lies flat over more than two notes.
 */

/** A note as its stem sees it: null places are rests. */
export type StemNote = Readonly<{ place: number | null; tick: number; written: WrittenValue }>

/** Depths are in staff spaces below the top line. */
export type Stem = Readonly<{ isUp: boolean; tipDepth: number; hasFlag: boolean }>

/** Notes by their place in the bar, the first and the last that a beam joins. */
export type Beam = Readonly<{ from: number; to: number; isUp: boolean }>

export type Stems = Readonly<{ stems: readonly (Stem | null)[]; beams: readonly Beam[] }>

const MIDDLE_PLACE = 4
const STEM_LENGTH = 3.5
/** Where several readings share a bar, their stems are short, so that they stay out of each other's way. */
const CROWDED_STEM_LENGTH = 2.5
const BEAMED_STEM_LENGTH = 3.1
const SLANT_BY_STEP = 0.25
const MOST_SLANT = 1

export const isStemUp = (place: number): boolean => place < MIDDLE_PLACE

function tipOf(place: number, isUp: boolean, length: number): number {
  const depth = depthStaffSpaces(place)
  const middle = depthStaffSpaces(MIDDLE_PLACE)
  return isUp ? Math.min(depth - length, middle) : Math.max(depth + length, middle)
}

/** Runs of eighth notes within a half note, two or more, by the index of the first and the last. */
function beamRuns(notes: readonly StemNote[]): readonly (readonly [from: number, to: number])[] {
  const runs: [number, number][] = []
  let from: number | null = null
  const halfOf = (i: number): number => Math.floor((notes[i]?.tick ?? 0) / (2 * QUARTER_TICKS))
  const isBeamable = (i: number): boolean => notes[i]?.place !== null && notes[i]?.written.value === 'eighth'
  for (let i = 0; i <= notes.length; i++) {
    const goesOn = i < notes.length && isBeamable(i) && (from === null || halfOf(from) === halfOf(i))
    if (goesOn) {
      from ??= i
      continue
    }
    if (from !== null && i - from > 1) runs.push([from, i - 1])
    from = i < notes.length && isBeamable(i) ? i : null
  }
  return runs
}

/** The stems of one reading of a bar. In a crowd there are flags for beams. */
export function stemsOf(notes: readonly StemNote[], isCrowded: boolean): Stems {
  const stems = notes.map(({ place, written }): Stem | null => {
    if (place === null || written.value === 'whole') return null
    const isUp = isStemUp(place)
    const hasFlag = written.value === 'eighth'
    const length = isCrowded && !hasFlag ? CROWDED_STEM_LENGTH : STEM_LENGTH
    const tipDepth = isCrowded
      ? depthStaffSpaces(place) + (isUp ? -length : length)
      : tipOf(place, isUp, length)
    return { isUp, hasFlag, tipDepth }
  })
  if (isCrowded) return { stems, beams: [] }
  const beams = beamRuns(notes).map(([from, to]): Beam => {
    const places = notes.slice(from, to + 1).map(({ place }) => place as number)
    const farthest = places.reduce((a, b) =>
      Math.abs(b - MIDDLE_PLACE) > Math.abs(a - MIDDLE_PLACE) ? b : a,
    )
    const isUp = isStemUp(farthest)
    const tips = places.map((place) => tipOf(place, isUp, BEAMED_STEM_LENGTH))
    const outermost = isUp ? Math.min : Math.max
    const [first, last] = [places[0] as number, places.at(-1) as number]
    const wanted = Math.sign(last - first) * Math.min(MOST_SLANT, Math.abs(last - first) * SLANT_BY_STEP)
    const slant = places.length > 2 ? 0 : wanted
    // The tips of the first and the last note; those between, where the beam lies flat, are as high.
    const start = outermost(...tips.map((tip, i) => tip + (i === places.length - 1 ? slant : 0)))
    for (let i = from; i <= to; i++)
      stems[i] = { isUp, hasFlag: false, tipDepth: start - (i === to ? slant : 0) }
    return { from, to, isUp }
  })
  return { stems, beams }
}
