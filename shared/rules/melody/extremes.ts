import { packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import { comparePitches } from '@/shared/theory/pitch'

/** The lowest and highest notes so far; where a note comes again, its first place. */
export type Extremes = Readonly<{ low: Noted; high: Noted }>

/** Takes a note into the extremes; the same object again when it lies between them. */
export function widen(extremes: Extremes | null, now: Noted): Extremes {
  if (extremes === null) return { low: now, high: now }
  if (comparePitches(now.note, extremes.low.note) < 0) return { low: now, high: extremes.high }
  if (comparePitches(now.note, extremes.high.note) > 0) return { low: extremes.low, high: now }
  return extremes
}

/** Extremes as a whole number below the square of `PITCH_ROOM`. */
export const packExtremes = (extremes: Extremes | null): number =>
  extremes === null ? 0 : packPitch(extremes.low.note) * PITCH_ROOM + packPitch(extremes.high.note)

/** Room that `packExtremes` needs. */
export const EXTREMES_ROOM = PITCH_ROOM * PITCH_ROOM
