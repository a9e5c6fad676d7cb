import { arcsOf } from '@/components/lesson/score-of'
import type { ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import type { Finding } from '@/shared/rules'
import type { Clef } from '@/shared/theory/clef'
import type { Gesture } from '@/shared/theory/gestures'
import { pitchOf, type PitchClass, type PitchName } from '@/shared/theory/pitch'
import { degreeOf } from '@/shared/theory/scale'

/** A cantus alone as a score. A null note is a bar that waits for one. Degrees stand under the notes when a final is given. */
export function cantusScoreOf({
  notes,
  clef,
  signature,
  final = null,
  findings = [],
  gestures = [],
  gestureLabel,
}: Readonly<{
  notes: readonly (PitchName | null)[]
  clef: Clef
  signature: number
  final?: PitchClass | null
  findings?: readonly Finding[]
  gestures?: readonly Gesture[]
  gestureLabel?: (gesture: Gesture) => string
}>): ScoreInput {
  const bars = notes.map((cantus, index): ScoreBar => ({
    number: index + 1,
    state: 'plain',
    isSetAside: false,
    cantus,
    line: null,
    proposals: [],
    figure: null,
    motion: null,
    label: final && cantus ? String(degreeOf(pitchOf(cantus), final)) : null,
  }))
  return {
    position: 'above',
    clefs: { cantus: clef, line: null },
    signature,
    bars,
    arcs: arcsOf(findings),
    brackets: gestureLabel
      ? gestures.map((gesture) => ({
          fromBar: gesture.from,
          toBar: gesture.to,
          label: gestureLabel(gesture),
        }))
      : [],
  }
}
