import { createChecker, type Checker } from '@/shared/rules/checker'
import type { SetAside } from '@/shared/rules/reading'
import type { Exercise, Finding, RuleSet } from '@/shared/rules/rule'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { figureOf, intervalBetween, isConsonant } from '@/shared/theory/interval'
import { nameInterval } from '@/shared/theory/interval-name'
import { motionBetween, type Motion } from '@/shared/theory/motion'
import type { Line } from '@/shared/theory/note'
import {
  comparePitches,
  diatonicNumber,
  formatPitch,
  LETTERS,
  parsePitch,
  type Letter,
  type Pitch,
  type PitchClass,
} from '@/shared/theory/pitch'
import {
  alterationInMode,
  degreeOf,
  leadingToneOf,
  raisesSeventh,
  scaleBetween,
  scaleOf,
  type Degree,
} from '@/shared/theory/scale'
import { usualFlatOf } from '@/shared/theory/usual-flat'

/** One pitch that might be written in a bar, and all that is known of it before it is. */
export type LadderChoice = Readonly<{
  pitch: Pitch
  degree: Degree
  /** Semitones by which it departs from the mode's own note. */
  alteration: number
  interval: Readonly<{ name: string; figure: string; isConsonant: boolean }>
  /** Motion from the bar that is read before; `null` where nothing is written there, or in the first bar. */
  motion: Motion | null
  /** What the rules would say of the line with this note in the bar, as far as it points at the bar. */
  findings: readonly Finding[]
  /** The gravest of them. */
  worst: Finding['level'] | null
}>

/** Asks for the choices at a bar. Rules and pitches are made ready once, so that asking is cheap enough for every tap. */
export type Ladder = (line: Line, bar: number, setAside?: SetAside) => readonly LadderChoice[]

/** How far the ladder reaches from the cantus: a twelfth, the outer limit of two voices. Common practice, no source. */
const REACH_STEPS = 11
/** How far the line may be tried on the wrong side of the cantus: a third. */
const CROSSING_STEPS = 2
const LOWEST_STEPS = 0
const HIGHEST_STEPS = 62

/** Modes in which Fux himself writes the flat that avoids the tritone (computed from his examples). */
const MODES_WITH_FLAT: ReadonlySet<string> = new Set(['dorian', 'lydian'])

export function createLadder(exercise: Exercise, ruleSet: RuleSet): Ladder {
  const checker = createChecker(exercise, ruleSet)
  const always = pitchesOf(exercise)
  const raised = raisedPitches(exercise, always)
  return (line, bar, setAside) => {
    const isNearClose = barsReadAfter(exercise, bar, setAside) === 1
    const isBeforeThat = barsReadAfter(exercise, bar, setAside) === 2
    const more = isNearClose ? raised.sevenths : isBeforeThat ? raised.sixths : []
    const pitches = [...always, ...more].sort((a, b) => comparePitches(b, a))
    return choose(exercise, checker, pitches, line, bar, setAside)
  }
}

/**
 * Every pitch at hand for a bar, from the highest down: the notes of the mode within reach of the cantus, the raised
 * degrees where the close wants them, and the usual flat. For many bars or taps create a ladder and keep it.
 */
export const ladderChoices = (
  exercise: Exercise,
  line: Line,
  bar: number,
  ruleSet: RuleSet,
  setAside?: SetAside,
): readonly LadderChoice[] => createLadder(exercise, ruleSet)(line, bar, setAside)

function choose(
  { cantus, mode, final }: Exercise,
  checker: Checker,
  pitches: readonly Pitch[],
  line: Line,
  bar: number,
  setAside: SetAside | undefined,
): readonly LadderChoice[] {
  const under = cantus[bar - 1]
  if (under === undefined) return []
  const proposals = pitches.map((pitch) => ({ [bar]: [{ pitch: formatPitch(pitch), ticks: WHOLE_TICKS }] }))
  const findings = setAside?.has(bar) ? [] : checker.annotate(line, proposals, setAside)
  const before = barReadBefore(bar, setAside)
  const cantusBefore = before === null ? undefined : cantus[before - 1]
  const lineBefore = before === null ? null : lastPitch(line, before)
  return pitches.map((pitch, index): LadderChoice => {
    const interval = intervalBetween(under, pitch)
    const raisedFindings = findings[index] ?? []
    return {
      pitch,
      degree: degreeOf(pitch, final),
      alteration: alterationInMode(pitch, mode, final),
      interval: {
        name: nameInterval(interval),
        figure: figureOf(interval),
        isConsonant: isConsonant(interval),
      },
      motion: cantusBefore && lineBefore ? motionBetween(cantusBefore, under, lineBefore, pitch) : null,
      findings: raisedFindings,
      worst: worstOf(raisedFindings),
    }
  })
}

function worstOf(findings: readonly Finding[]): LadderChoice['worst'] {
  if (findings.length === 0) return null
  return findings.some(({ level }) => level === 'law') ? 'law' : 'preference'
}

/** The notes of the mode within reach, and the usual flat among them. They are the same in every bar. */
function pitchesOf({ cantus, mode, final, position }: Exercise): readonly Pitch[] {
  const steps = cantus.map(diatonicNumber)
  const low = Math.min(...steps)
  const high = Math.max(...steps)
  const reach = Math.max(REACH_STEPS, high - low + 7)
  const from = position === 'above' ? low - CROSSING_STEPS : high - reach
  const to = position === 'above' ? low + reach : high + CROSSING_STEPS
  const scale = scaleBetween(mode, final, pitchAt(from), pitchAt(to))
  const flat = MODES_WITH_FLAT.has(mode) ? usualFlatOf(mode, final) : null
  return flat ? [...scale, ...onLetter(scale, flat)] : scale
}

/** The raised seventh, and where the sixth of the mode is low, the raised sixth on the way to it. */
function raisedPitches(
  { mode, final }: Exercise,
  at: readonly Pitch[],
): Readonly<{ sevenths: readonly Pitch[]; sixths: readonly Pitch[] }> {
  const leading = raisesSeventh(mode) ? leadingToneOf(mode, final) : null
  const scale = scaleOf(mode, final)
  const sixth = mode === 'aeolian' && scale.ok ? scale.value[5] : undefined
  const raisedSixth = sixth && sixth.alteration < 2 ? { ...sixth, alteration: sixth.alteration + 1 } : null
  return {
    sevenths: leading ? onLetter(at, leading) : [],
    sixths: raisedSixth ? onLetter(at, raisedSixth as PitchClass) : [],
  }
}

/** One pitch class in every octave in which its letter is at hand. */
const onLetter = (at: readonly Pitch[], pitchClass: PitchClass): readonly Pitch[] =>
  at
    .filter(({ letter }) => letter === pitchClass.letter)
    .map(({ octave }) => ({ ...pitchClass, octave }))
    .filter((pitch, index, all) => all.findIndex(({ octave }) => octave === pitch.octave) === index)

function pitchAt(steps: number): Pitch {
  const inside = Math.min(HIGHEST_STEPS, Math.max(LOWEST_STEPS, steps))
  return { letter: LETTERS[inside % 7] as Letter, alteration: 0, octave: Math.floor(inside / 7) }
}

function barReadBefore(bar: number, setAside: SetAside | undefined): number | null {
  for (let before = bar - 1; before >= 1; before -= 1) if (!setAside?.has(before)) return before
  return null
}

function barsReadAfter({ cantus }: Exercise, bar: number, setAside: SetAside | undefined): number {
  let count = 0
  for (let after = bar + 1; after <= cantus.length; after += 1) if (!setAside?.has(after)) count += 1
  return count
}

function lastPitch(line: Line, bar: number): Pitch | null {
  const parsed = parsePitch(line[bar]?.at(-1)?.pitch ?? '')
  return parsed.ok ? parsed.value : null
}
