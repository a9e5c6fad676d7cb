import type { ActiveRule } from '@/shared/rules/rule-set'
import type { Exercise } from '@/shared/rules/rule'
import {
  comparePitches,
  diatonicNumber,
  LETTERS,
  parsePitch,
  type Letter,
  type Pitch,
  type PitchClass,
  type PitchName,
} from '@/shared/theory/pitch'
import { leadingToneOf, raisesSeventh, scaleBetween, scaleOf } from '@/shared/theory/scale'
import { usualFlatOf } from '@/shared/theory/usual-flat'

/** Lowest and highest note that a line may use. */
export type Compass = Readonly<{ lowest: PitchName; highest: PitchName }>

/** How far a line may lie from the cantus: a twelfth, the outer limit of two voices. Common practice, no source. */
const REACH_STEPS = 11
/** How far it may be tried on the wrong side of the cantus: a third. */
const CROSSING_STEPS = 2
const LOWEST_STEPS = 0
const HIGHEST_STEPS = 62

/**
 * The pitches a search tries in every bar, ascending: the notes of the mode in the compass, and those altered notes
 * that some rule of the books lets stand, namely the raised seventh, in Aeolian the raised sixth, and the usual flat.
 * Where the rules have no law on other accidentals, others remain untried. The compass is the one asked for; else that
 * of the rules, where it is law; else what lies within reach of the cantus.
 */
export function poolOf(
  exercise: Exercise,
  active: readonly ActiveRule[],
  compass?: Compass,
): readonly Pitch[] {
  const { mode, final } = exercise
  const { low, high } = boundsOf(exercise, active, compass)
  const scale = scaleBetween(mode, final, low, high)
  const altered = [
    raisesSeventh(mode) ? leadingToneOf(mode, final) : null,
    mode === 'aeolian' ? raisedSixthOf(exercise) : null,
    usualFlatOf(mode, final),
  ].filter((pitchClass) => pitchClass !== null)
  const more = altered.flatMap((pitchClass) => inEveryOctave(pitchClass, low, high))
  return [...scale, ...more].filter(isWithin(low, high)).sort(comparePitches)
}

function boundsOf(
  { cantus, position }: Exercise,
  active: readonly ActiveRule[],
  compass: Compass | undefined,
): Readonly<{ low: Pitch; high: Pitch }> {
  const law = active.find(({ rule, level }) => rule.id === 'voice-compass' && level === 'law')
  const given = compass ?? (law ? compassOfLaw(law.params as CompassParams, position) : undefined)
  const low = given && parsePitch(given.lowest)
  const high = given && parsePitch(given.highest)
  if (low?.ok && high?.ok) return { low: low.value, high: high.value }
  const steps = cantus.map(diatonicNumber)
  const lowest = Math.min(...steps)
  const highest = Math.max(...steps)
  const reach = Math.max(REACH_STEPS, highest - lowest + 7)
  return position === 'above'
    ? { low: pitchAt(lowest - CROSSING_STEPS, -2), high: pitchAt(lowest + reach, 2) }
    : { low: pitchAt(highest - reach, -2), high: pitchAt(highest + CROSSING_STEPS, 2) }
}

type CompassParams = Readonly<Record<'aboveLow' | 'aboveHigh' | 'belowLow' | 'belowHigh', PitchName>>

const compassOfLaw = (params: CompassParams, position: Exercise['position']): Compass =>
  position === 'above'
    ? { lowest: params.aboveLow, highest: params.aboveHigh }
    : { lowest: params.belowLow, highest: params.belowHigh }

function raisedSixthOf({ mode, final }: Exercise): PitchClass | null {
  const scale = scaleOf(mode, final)
  const sixth = scale.ok ? scale.value[5] : undefined
  if (!sixth || sixth.alteration === 2) return null
  return { ...sixth, alteration: (sixth.alteration + 1) as PitchClass['alteration'] }
}

function inEveryOctave(pitchClass: PitchClass, low: Pitch, high: Pitch): readonly Pitch[] {
  const pitches: Pitch[] = []
  for (let octave = low.octave; octave <= high.octave; octave += 1) pitches.push({ ...pitchClass, octave })
  return pitches
}

const isWithin =
  (low: Pitch, high: Pitch) =>
  (pitch: Pitch): boolean =>
    comparePitches(pitch, low) >= 0 && comparePitches(pitch, high) <= 0

function pitchAt(steps: number, alteration: Pitch['alteration']): Pitch {
  const inside = Math.min(HIGHEST_STEPS, Math.max(LOWEST_STEPS, steps))
  return { letter: LETTERS[inside % 7] as Letter, alteration, octave: Math.floor(inside / 7) }
}
