import fc from 'fast-check'
import type { Exercise, Species } from '@/shared/rules/rule'
import type { Line } from '@/shared/theory/note'
import { pitchClassOf, pitchOf, type PitchName } from '@/shared/theory/pitch'

/** Printed with a failure, and changed on purpose only. */
export const SEED = 20_261

/** Notes round D4 to A5 with those accidentals that rules speak of; few, so that lines meet often. */
const LINE_NAMES: readonly PitchName[] = [
  'B3',
  'C4',
  'C#4',
  'D4',
  'E4',
  'F4',
  'F#4',
  'G4',
  'G#4',
  'A4',
  'Bb4',
  'B4',
  'C5',
  'C#5',
  'D5',
  'E5',
  'F5',
]
const CANTUS_NAMES: readonly PitchName[] = ['A3', 'B3', 'C4', 'D4', 'E4', 'F4', 'G4', 'A4']

const name = (names: readonly PitchName[]) => fc.constantFrom(...names)

/** An exercise of a few bars in any mode on D, E or A. */
export const anyExercise = (barCount: number, species: Species = 1): fc.Arbitrary<Exercise> =>
  fc
    .record({
      cantus: fc.array(name(CANTUS_NAMES), { minLength: barCount, maxLength: barCount }),
      mode: fc.constantFrom('ionian', 'dorian', 'phrygian', 'lydian', 'mixolydian', 'aeolian'),
      final: fc.constantFrom('D', 'E', 'A'),
      position: fc.constantFrom('above', 'below'),
    })
    .map(({ cantus, mode, final, position }) => ({
      cantus: cantus.map(pitchOf),
      mode,
      final: pitchClassOf(final),
      position,
      species,
    }))

export const whole = (pitch: PitchName) => [{ pitch, ticks: 1920 }]

/** A line of whole notes, every bar written. */
export const anyLine = (barCount: number, names: readonly PitchName[] = LINE_NAMES): fc.Arbitrary<Line> =>
  fc
    .array(name(names), { minLength: barCount, maxLength: barCount })
    .map((pitches) => Object.fromEntries(pitches.map((pitch, index) => [index + 1, whole(pitch)])))

/** Notes for some bars. */
export const anyBars = (barCount: number, most: number): fc.Arbitrary<Line> =>
  fc
    .array(fc.tuple(fc.integer({ min: 1, max: barCount }), name(LINE_NAMES)), {
      minLength: 1,
      maxLength: most,
    })
    .map((pairs) => Object.fromEntries(pairs.map(([bar, pitch]) => [bar, whole(pitch)])))

/** Some bar numbers. */
export const someBars = (barCount: number, most = barCount): fc.Arbitrary<ReadonlySet<number>> =>
  fc.uniqueArray(fc.integer({ min: 1, max: barCount }), { maxLength: most }).map((bars) => new Set(bars))

/** A line without some of its bars. */
export const without = (line: Line, bars: ReadonlySet<number>): Line =>
  Object.fromEntries(Object.entries(line).filter(([bar]) => !bars.has(Number(bar))))
