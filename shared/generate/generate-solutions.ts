import type { GenerationProblem } from '@/shared/generate/generation-problem'
import { fail, ok, type Result } from '@/shared/result'
import type { Exercise, RuleSet } from '@/shared/rules/rule'
import { createSearch, type Question, type SearchOptions } from '@/shared/search'
import type { Line } from '@/shared/theory/note'

export type GeneratedSolutions = Readonly<{ lines: readonly Line[]; count: bigint; isExact: boolean }>

/** Draws whole lines evenly from all that break no law, or says where none can go on. */
export function generateSolutions(
  exercise: Exercise,
  ruleSet: RuleSet,
  {
    seed,
    times = 1,
    question,
    ...options
  }: SearchOptions & Readonly<{ seed: number; times?: number; question?: Question }>,
): Result<GeneratedSolutions, GenerationProblem> {
  const { count, isExact, deadEnd, draw } = createSearch(exercise, ruleSet, options).find(question)
  if (count === 0n) {
    const message = deadEnd
      ? `No note is left for bar ${deadEnd.bar}.`
      : 'No line that breaks no law was found in the time given.'
    return fail({ code: deadEnd ? 'impossible' : 'not-found', message, rules: deadEnd?.rules ?? [] })
  }
  return ok({ lines: draw(seed, times), count, isExact })
}
