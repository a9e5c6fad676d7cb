import { fail, ok, type Result } from '@/shared/result'
import type { Mode } from '@/shared/theory/mode'
import {
  diatonicNumber,
  LETTERS,
  letterIndex,
  letterSemitones,
  type Alteration,
  type Letter,
  type Pitch,
  type PitchClass,
} from '@/shared/theory/pitch'

/** 1 is the final, 7 the note under it. */
export type Degree = 1 | 2 | 3 | 4 | 5 | 6 | 7

/** Semitones of each degree above the final. Common practice, no source. */
export const SCALE_SEMITONES: Readonly<Record<Mode, readonly number[]>> = {
  ionian: [0, 2, 4, 5, 7, 9, 11],
  dorian: [0, 2, 3, 5, 7, 9, 10],
  phrygian: [0, 1, 3, 5, 7, 8, 10],
  lydian: [0, 2, 4, 6, 7, 9, 11],
  mixolydian: [0, 2, 4, 5, 7, 9, 10],
  aeolian: [0, 2, 3, 5, 7, 8, 10],
}

/** Modes with a whole tone under the final, where the seventh degree is raised at the close; Phrygian keeps its own. */
const RAISES_SEVENTH: Readonly<Record<Mode, boolean>> = {
  ionian: false,
  dorian: true,
  phrygian: false,
  lydian: false,
  mixolydian: true,
  aeolian: true,
}

export const raisesSeventh = (mode: Mode): boolean => RAISES_SEVENTH[mode]

/** Degree of a pitch by its letter alone: F and F♯ are both degree 3 over D. */
export const degreeOf = (pitch: PitchClass, final: PitchClass): Degree =>
  (((letterIndex(pitch.letter) - letterIndex(final.letter) + 7) % 7) + 1) as Degree

/** Semitones by which a pitch stands above (or below) the mode's own note on its letter; 0 when it belongs to the mode. */
export function alterationInMode(pitch: PitchClass, mode: Mode, final: PitchClass): number {
  const degree = degreeOf(pitch, final)
  return semitonesAbove(pitch, final) - (SCALE_SEMITONES[mode][degree - 1] as number)
}

/** True when a pitch is one of the mode's own notes, exactly spelled. */
export const isDiatonic = (pitch: PitchClass, mode: Mode, final: PitchClass): boolean =>
  alterationInMode(pitch, mode, final) === 0

/** True for the seventh degree raised by a semitone, in the modes that raise it. */
export const isRaisedSeventh = (pitch: PitchClass, mode: Mode, final: PitchClass): boolean =>
  RAISES_SEVENTH[mode] && degreeOf(pitch, final) === 7 && alterationInMode(pitch, mode, final) === 1

/** True for the note that leads to the final at the close: raised where the mode raises it, else its own seventh. */
export const isLeadingTone = (pitch: PitchClass, mode: Mode, final: PitchClass): boolean =>
  degreeOf(pitch, final) === 7 && alterationInMode(pitch, mode, final) === (RAISES_SEVENTH[mode] ? 1 : 0)

/** True for any octave of the final. */
export const isFinal = (pitch: PitchClass, final: PitchClass): boolean =>
  pitch.letter === final.letter && pitch.alteration === final.alteration

/** The seven notes of a mode from its final upward; refused when a note would need more than two accidentals. */
export function scaleOf(mode: Mode, final: PitchClass): Result<readonly PitchClass[], 'no-spelling'> {
  const notes: PitchClass[] = []
  for (const [index, semitones] of SCALE_SEMITONES[mode].entries()) {
    const letter = LETTERS[(letterIndex(final.letter) + index) % 7] as Letter
    const alteration = semitones - semitonesAbove({ letter, alteration: 0 }, final)
    if (Math.abs(alteration) > 2) return fail('no-spelling')
    notes.push({ letter, alteration: alteration as Alteration })
  }
  return ok(notes)
}

/** The note that leads to the final at the close, or `null` where no spelling carries it. */
export function leadingToneOf(mode: Mode, final: PitchClass): PitchClass | null {
  const scale = scaleOf(mode, final)
  if (!scale.ok) return null
  const seventh = scale.value[6] as PitchClass
  const alteration = seventh.alteration + (RAISES_SEVENTH[mode] ? 1 : 0)
  return alteration > 2 ? null : { letter: seventh.letter, alteration: alteration as Alteration }
}

/** Every note of a mode from `low` to `high`, ascending: what a ladder of pitches shows. */
export function scaleBetween(mode: Mode, final: PitchClass, low: Pitch, high: Pitch): readonly Pitch[] {
  const scale = scaleOf(mode, final)
  if (!scale.ok) return []
  const pitches: Pitch[] = []
  for (let steps = diatonicNumber(low); steps <= diatonicNumber(high); steps += 1) {
    const letter = LETTERS[steps % 7] as Letter
    const pitchClass = scale.value.find((note) => note.letter === letter)
    if (pitchClass) pitches.push({ ...pitchClass, octave: Math.floor(steps / 7) })
  }
  return pitches
}

/** Semitones from the final up to the next pitch of a class, counted by letters: from D up to C♯ eleven, to C♭ nine. */
function semitonesAbove(pitch: PitchClass, final: PitchClass): number {
  const octaveUp = letterIndex(pitch.letter) < letterIndex(final.letter) ? 12 : 0
  const letters = letterSemitones(pitch.letter) - letterSemitones(final.letter)
  return letters + octaveUp + pitch.alteration - final.alteration
}
