import { findGestures, type Gesture } from '@/shared/theory/gestures'
import {
  directionFrom,
  intervalBetween,
  stepsFrom,
  type Direction,
  type Interval,
} from '@/shared/theory/interval'
import { signatureOf } from '@/shared/theory/key'
import { MODES, type Mode } from '@/shared/theory/mode'
import { comparePitches, type Pitch, type PitchClass } from '@/shared/theory/pitch'
import { degreeOf, isDiatonic, type Degree } from '@/shared/theory/scale'

/** What the line does after a leap: a step back, some other motion back, none, or nothing more to come. */
export type Recovery = 'step-back' | 'turns-back' | 'none' | 'end'

/** A leap, by the 1-based bar it arrives in. */
export type Leap = Readonly<{ bar: number; interval: Interval; direction: Direction; recovery: Recovery }>

/** What a melody is like, as data: for the words beside the editor, and live while it is written. */
export type CantusAnalysis = Readonly<{
  length: number
  /** The note it ends on, taken for the final. */
  final: PitchClass
  /** Modes on that final to which every note belongs, the plainest signature first; often more than one. */
  modes: readonly Mode[]
  /** Whether every note belongs to the declared mode, and the melody ends on its final. */
  fitsDeclared: boolean
  lowest: Pitch
  highest: Pitch
  range: Interval
  /** Bars of the highest note; one, where the line has a single peak. */
  apexBars: readonly number[]
  leaps: readonly Leap[]
  steps: number
  repeats: number
  /** Share of steps among the moves, 0 to 1; `null` where nothing moves. */
  stepShare: number | null
  /** Degrees of the last two notes over the declared final; `null` below two notes. */
  cadence: readonly [Degree, Degree] | null
  /** Spans of three bars or more that the contour suggests, without gaps. */
  gestures: readonly Gesture[]
}>

/** Analyses a melody of at least one note; `null` for none. */
export function analyseCantus(
  cantus: readonly Pitch[],
  declared: Readonly<{ mode: Mode; final: PitchClass }>,
): CantusAnalysis | null {
  const last = cantus.at(-1)
  if (last === undefined) return null
  const final: PitchClass = { letter: last.letter, alteration: last.alteration }
  const byHeight = [...cantus].sort(comparePitches)
  const lowest = byHeight[0] as Pitch
  const highest = byHeight.at(-1) as Pitch
  const sizes = cantus.slice(1).map((pitch, index) => Math.abs(stepsFrom(cantus[index] as Pitch, pitch)))
  const steps = sizes.filter((size) => size === 1).length
  const leaps = findLeaps(cantus)
  const moves = steps + leaps.length
  const penultimate = cantus.at(-2)
  return {
    length: cantus.length,
    final,
    modes: findModes(cantus, final),
    fitsDeclared:
      final.letter === declared.final.letter &&
      final.alteration === declared.final.alteration &&
      cantus.every((pitch) => isDiatonic(pitch, declared.mode, declared.final)),
    lowest,
    highest,
    range: intervalBetween(lowest, highest),
    apexBars: cantus.flatMap((pitch, index) => (comparePitches(pitch, highest) === 0 ? [index + 1] : [])),
    leaps,
    steps,
    repeats: sizes.length - moves,
    stepShare: moves === 0 ? null : steps / moves,
    cadence: penultimate ? [degreeOf(penultimate, declared.final), degreeOf(last, declared.final)] : null,
    gestures: findGestures(cantus),
  }
}

/** Modes on a final that hold every note, those with the fewest accidentals at the clef first. */
function findModes(cantus: readonly Pitch[], final: PitchClass): readonly Mode[] {
  const weight = (mode: Mode): number => Math.abs(signatureOf(mode, final) ?? Infinity)
  return MODES.filter((mode) => cantus.every((pitch) => isDiatonic(pitch, mode, final))).sort(
    (a, b) => weight(a) - weight(b),
  )
}

function findLeaps(cantus: readonly Pitch[]): readonly Leap[] {
  const leaps: Leap[] = []
  for (let index = 1; index < cantus.length; index += 1) {
    const from = cantus[index - 1] as Pitch
    const to = cantus[index] as Pitch
    const interval = intervalBetween(from, to)
    if (interval.steps < 2) continue
    const direction = directionFrom(from, to)
    leaps.push({
      bar: index + 1,
      interval,
      direction,
      recovery: recoveryOf(to, cantus[index + 1], direction),
    })
  }
  return leaps
}

/** What a line that has leapt to a note does next. */
export function recoveryOf(to: Pitch, next: Pitch | undefined, direction: Direction): Recovery {
  if (next === undefined) return 'end'
  const steps = stepsFrom(to, next)
  if (steps === 0 || Math.sign(steps) === direction) return 'none'
  return Math.abs(steps) === 1 ? 'step-back' : 'turns-back'
}
