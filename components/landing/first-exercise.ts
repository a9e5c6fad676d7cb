import type { BarMotion, ScoreBar, ScoreInput } from '@/shared/notation/score-input'
import { WHOLE_TICKS } from '@/shared/theory/duration'
import { figureOf, intervalBetween } from '@/shared/theory/interval'
import { motionBetween } from '@/shared/theory/motion'
import { pitchOf, type Pitch } from '@/shared/theory/pitch'

/** Source: J. J. Fux, Gradus ad Parnassum (Vienna 1725), Book II, the first exercise: cantus in D, counterpoint above. */
const CANTUS = 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'.split(' ')
const LINE = 'A4 A4 G4 A4 B4 C5 C5 B4 D5 C#5 D5'.split(' ')
/** Where the second gesture of the cantus begins. */
const SECOND_GESTURE_BAR = 6

/** The exercise as a score, worked out by the same theory as every other. */
export function firstExercise(labels: readonly [first: string, second: string]): ScoreInput {
  const cantus = CANTUS.map(pitchOf)
  const line = LINE.map(pitchOf)
  const motionInto = (index: number): BarMotion | null =>
    index === 0
      ? null
      : motionBetween(
          cantus[index - 1] as Pitch,
          cantus[index] as Pitch,
          line[index - 1] as Pitch,
          line[index] as Pitch,
        )
  const bars = CANTUS.map((name, index): ScoreBar => {
    const interval = intervalBetween(cantus[index] as Pitch, line[index] as Pitch)
    return {
      number: index + 1,
      state: 'plain',
      isSetAside: false,
      cantus: name,
      line: [{ pitch: LINE[index] as string, ticks: WHOLE_TICKS }],
      proposals: [],
      figure: { text: figureOf(interval), tone: 'cantus' },
      motion: motionInto(index),
      label: null,
    }
  })
  return {
    position: 'above',
    clefs: { cantus: 'treble', line: 'treble' },
    signature: 0,
    bars,
    arcs: [],
    brackets: [
      { fromBar: 1, toBar: SECOND_GESTURE_BAR - 1, label: labels[0] },
      { fromBar: SECOND_GESTURE_BAR, toBar: CANTUS.length, label: labels[1] },
    ],
  }
}
