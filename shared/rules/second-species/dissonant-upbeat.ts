import { isDissonance, type Sonority } from '@/shared/rules/first-species/sonority'
import { stepsTo } from '@/shared/rules/second-species/folds'

/**
 * What a dissonant upbeat makes with the notes round it. `leapt-into`: not entered by step. `neighbour`: left by a step
 * back. `dropped-third`: left by a falling third. `leapt-from`: left otherwise than by step. `onto-dissonance`: passes
 * on by step, to another dissonance. `null`: as yet nothing to say.
 */
export type UpbeatShape =
  'passing' | 'neighbour' | 'dropped-third' | 'leapt-into' | 'leapt-from' | 'onto-dissonance'

/** Each shape but `passing` is the matter of one rule, so that one fault is told once. */
export function shapeOfUpbeat(from: Sonority | null, at: Sonority, to: Sonority | null): UpbeatShape | null {
  const entry = from === null ? 0 : stepsTo(from, at)
  if (from === null || Math.abs(entry) !== 1) return 'leapt-into'
  if (to === null) return null
  const exit = stepsTo(at, to)
  if (exit === -2) return 'dropped-third'
  if (Math.abs(exit) !== 1) return 'leapt-from'
  if (exit === -entry) return 'neighbour'
  return isDissonance(to) ? 'onto-dissonance' : 'passing'
}

/** The notes of a figure that there are. */
export const figureOf = (...notes: readonly (Sonority | null)[]): readonly Sonority[] =>
  notes.filter((note): note is Sonority => note !== null)
