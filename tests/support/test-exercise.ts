import { PRESETS } from '@/shared/rules/presets'
import type { BoardExercise, StageSettings } from '@/shared/wire/documents'

/** A small exercise that breaks nothing. */
export const testExercise = (): BoardExercise => ({
  title: 'Fux on D',
  cantus: ['D4', 'F4', 'E4', 'D4', 'G4', 'F4', 'A4', 'G4', 'F4', 'E4', 'D4'],
  mode: 'dorian',
  final: 'D',
  species: 1,
  position: 'above',
  clefs: { cantus: 'alto', line: 'treble' },
  signature: 0,
  ruleSet: structuredClone(PRESETS[0]) as BoardExercise['ruleSet'],
})

export const testStage = (): StageSettings => ({
  prompt: 'The cadence',
  showsFindings: true,
  showsSpread: false,
  showsNames: false,
  showsWays: 'nobody',
})
