import type { Exercise, Position, Species } from '@/shared/rules/rule'
import type { Mode } from '@/shared/theory/mode'
import { pitchClassOf, pitchOf, type PitchName } from '@/shared/theory/pitch'

/** An exercise as documents and requests carry it, already checked by their schema. */
export type WrittenExercise = Readonly<{
  cantus: readonly PitchName[]
  mode: Mode
  final: string
  species: Species
  position: Position
}>

/** The exercise that a document names, with its pitches read. Throws on names that the schema would have refused. */
export const readExercise = ({ cantus, mode, final, species, position }: WrittenExercise): Exercise => ({
  cantus: cantus.map(pitchOf),
  mode,
  final: pitchClassOf(final),
  species,
  position,
})
