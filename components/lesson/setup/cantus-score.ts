import type { Cantus } from '@/shared/api/cantus'
import type { ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import { signatureOf } from '@/shared/theory/key'
import type { BoardExercise } from '@/shared/wire/documents'
import { readPitchClass } from './setup-form'

const bar = (number: number, cantus: string, state: ScoreBar['state']): ScoreBar => ({
  number,
  state,
  isSetAside: false,
  cantus,
  line: null,
  proposals: [],
  figure: null,
  motion: null,
  label: null,
})

/** A melody alone on its staff. */
export function cantusScoreOf(cantus: Cantus): ScoreInput {
  const final = readPitchClass(cantus.final)
  return {
    position: 'above',
    clefs: { cantus: cantus.clef, line: null },
    signature: (final && signatureOf(cantus.mode, final)) ?? 0,
    bars: cantus.notes.map((pitch, index) => bar(index + 1, pitch, 'plain')),
    arcs: [],
    brackets: [],
  }
}

/** The exercise as it will stand before the class: both staves, nothing released. */
export const exerciseScoreOf = (exercise: BoardExercise): ScoreInput => ({
  position: exercise.position,
  clefs: exercise.clefs,
  signature: exercise.signature,
  bars: exercise.cantus.map((pitch, index) => bar(index + 1, pitch, 'frozen')),
  arcs: [],
  brackets: [],
})
