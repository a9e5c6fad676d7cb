import { checkCantus, readExercise, type Finding } from '@/shared/rules'
import { comparePitches, formatPitchClass, parsePitch, type Pitch } from '@/shared/theory/pitch'
import { isComfortable } from '@/shared/theory/clef'
import type { BoardExercise } from '@/shared/wire/documents'

/** What may be wrong with an exercise though it can be made: told before the class finds it. */
export type Doubt = Readonly<
  | { kind: 'clef'; pitch: Pitch }
  | { kind: 'last-not-final'; pitch: Pitch; final: string }
  | { kind: 'finding'; finding: Finding }
>

/** Everything that a teacher would want to know of an exercise before opening it. Empty when it is sound. */
export function doubtsOf(written: BoardExercise): readonly Doubt[] {
  const exercise = readExercise(written)
  const doubts: Doubt[] = []
  const far = exercise.cantus.filter((pitch) => !isComfortable(pitch, written.clefs.cantus))
  const farthest = [...far].sort(comparePitches).at(-1)
  if (farthest) doubts.push({ kind: 'clef', pitch: farthest })
  const last = exercise.cantus.at(-1)
  const final = parsePitch(`${written.final}4`)
  if (last && final.ok && formatPitchClass(last) !== formatPitchClass(final.value))
    doubts.push({ kind: 'last-not-final', pitch: last, final: written.final })
  for (const finding of checkCantus(exercise, written.ruleSet)) doubts.push({ kind: 'finding', finding })
  return doubts
}
