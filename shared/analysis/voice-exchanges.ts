import { downbeatsOf, readStretches, type Sonority } from '@/shared/analysis/sonorities'
import type { SetAside } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import { directionFrom, stepsFrom } from '@/shared/theory/interval'
import type { Line } from '@/shared/theory/note'
import { formatPitchClass, type PitchClass } from '@/shared/theory/pitch'

/** Two voices that take each other's notes, in any octave: D under F, then F under D. */
export type VoiceExchange = Readonly<{
  fromBar: number
  toBar: number
  /** Names of the two notes, the cantus's first one first. */
  notes: readonly [string, string]
  /** True where a passing note stands between, as in tenth, octave, sixth. */
  isPassing: boolean
}>

/**
 * Voice exchanges between the downbeats of neighbouring bars, or of bars two apart when both voices walk by step in
 * contrary motion through the bar between. Common practice, no source.
 */
export function findVoiceExchanges(
  exercise: Exercise,
  line: Line,
  setAside?: SetAside,
): readonly VoiceExchange[] {
  return readStretches(exercise, line, setAside).flatMap((stretch) => {
    const downbeats = downbeatsOf(stretch)
    return downbeats.flatMap((from, index) => {
      const next = downbeats[index + 1]
      const after = downbeats[index + 2]
      const found: VoiceExchange[] = []
      if (next && isExchange(from, next)) found.push(exchangeOf(from, next, false))
      if (next && after && isExchange(from, after) && passesThrough(from, next, after)) {
        found.push(exchangeOf(from, after, true))
      }
      return found
    })
  })
}

const isExchange = (from: Sonority, to: Sonority): boolean =>
  !isSameClass(from.cantus, from.line) &&
  isSameClass(from.cantus, to.line) &&
  isSameClass(from.line, to.cantus)

const isSameClass = (a: PitchClass, b: PitchClass): boolean =>
  a.letter === b.letter && a.alteration === b.alteration

function passesThrough(from: Sonority, between: Sonority, to: Sonority): boolean {
  const cantus = directionFrom(from.cantus, between.cantus)
  const line = directionFrom(from.line, between.line)
  return (
    cantus === -line &&
    [
      [from.cantus, between.cantus, to.cantus, cantus] as const,
      [from.line, between.line, to.line, line] as const,
    ].every(([a, b, c, direction]) => stepsFrom(a, b) === direction && stepsFrom(b, c) === direction)
  )
}

const exchangeOf = (from: Sonority, to: Sonority, isPassing: boolean): VoiceExchange => ({
  fromBar: from.bar,
  toBar: to.bar,
  notes: [formatPitchClass(from.cantus), formatPitchClass(from.line)],
  isPassing,
})
