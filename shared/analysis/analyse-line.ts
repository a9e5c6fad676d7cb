import { listMotions, shareMotions, type MotionInto, type MotionShares } from '@/shared/analysis/motions'
import { findParallelRuns, type ParallelRun } from '@/shared/analysis/parallel-runs'
import { findShape, type LineShape } from '@/shared/analysis/shape'
import { readStretches } from '@/shared/analysis/sonorities'
import { findVoiceExchanges, type VoiceExchange } from '@/shared/analysis/voice-exchanges'
import type { SetAside } from '@/shared/rules/reading'
import type { Exercise } from '@/shared/rules/rule'
import { intervalBetween, isImperfectConsonance, isPerfectConsonance } from '@/shared/theory/interval'
import type { Line } from '@/shared/theory/note'

/** How the sonorities on the downbeats divide. */
export type SonorityCounts = Readonly<{ perfect: number; imperfect: number; dissonant: number }>

/** "What did we do?" of a line over its cantus, as data. A partial line is analysed as far as it is written. */
export type LineAnalysis = Readonly<{
  motions: readonly MotionInto[]
  motionShares: MotionShares
  voiceExchanges: readonly VoiceExchange[]
  parallelRuns: readonly ParallelRun[]
  sonorities: SonorityCounts
  /** `null` where nothing is written. */
  shape: LineShape | null
}>

export function analyseLine(exercise: Exercise, line: Line, setAside?: SetAside): LineAnalysis {
  const motions = listMotions(exercise, line, setAside)
  return {
    motions,
    motionShares: shareMotions(motions),
    voiceExchanges: findVoiceExchanges(exercise, line, setAside),
    parallelRuns: findParallelRuns(exercise, line, setAside),
    sonorities: countSonorities(exercise, line, setAside),
    shape: findShape(exercise.cantus.length, line, setAside),
  }
}

function countSonorities(exercise: Exercise, line: Line, setAside?: SetAside): SonorityCounts {
  const counts = { perfect: 0, imperfect: 0, dissonant: 0 }
  for (const { place, cantus, line: note } of readStretches(exercise, line, setAside).flat()) {
    if (place !== 0) continue
    const interval = intervalBetween(cantus, note)
    if (isPerfectConsonance(interval)) counts.perfect += 1
    else if (isImperfectConsonance(interval)) counts.imperfect += 1
    else counts.dissonant += 1
  }
  return counts
}
