import { ruleSetProblems } from '@/shared/rules'
import type { FieldProblem } from '@/shared/api/errors'
import { isComfortable } from '@/shared/theory/clef'
import { formatPitchClass, pitchOf } from '@/shared/theory/pitch'
import type { BoardExercise } from '@/shared/wire/documents'

/** What keeps an exercise from being one, beyond its shape: its clef, its final, its rule set. */
export function exerciseProblems(exercise: BoardExercise): readonly FieldProblem[] {
  const { cantus, final, clefs, ruleSet } = exercise
  const pitches = cantus.map(pitchOf)
  const last = pitches.at(-1)
  const outside = pitches.flatMap((pitch, index): readonly FieldProblem[] =>
    isComfortable(pitch, clefs.cantus)
      ? []
      : [{ path: `exercise.cantus.${index}`, code: 'out-of-clef-range', args: { bar: index + 1 } }],
  )
  const wrongFinal: readonly FieldProblem[] =
    last && formatPitchClass(last) === final ? [] : [{ path: 'exercise.final', code: 'wrong-final' }]
  const rules = ruleSetProblems(ruleSet).map((problem): FieldProblem => ({
    path: `exercise.ruleSet.rules.${problem.ruleId}`,
    code: problem.code,
  }))
  return [...outside, ...wrongFinal, ...rules]
}
