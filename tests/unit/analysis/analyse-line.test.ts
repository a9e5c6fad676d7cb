import fc from 'fast-check'
import {
  analyseLine,
  findParallelRuns,
  findShape,
  findVoiceExchanges,
  listMotions,
  shareMotions,
} from '@/shared/analysis'
import { readExample, type Exercise } from '@/shared/rules'
import { formatInterval } from '@/shared/theory/interval-name'
import { formatPitch } from '@/shared/theory/pitch'
import { anyExercise, anyLine, SEED, someBars, without } from '../rules/random-score'

const DORIAN = 'D4 F4 E4 D4 G4 F4 A4 G4 F4 E4 D4'
const read = (cantus: string, line: string, species: Exercise['species'] = 1) =>
  readExample({ cantus, line, species, mode: 'dorian', final: 'D', breaches: [] })

/** Figure 5 of Fux's Gradus, 1725; its motions were counted by hand. */
const FUX_5 = read(DORIAN, 'A4 A4 G4 A4 B4 C5 C5 B4 D5 C#5 D5')
/** Figure 33, second species. */
const FUX_33 = read(
  DORIAN,
  'A4:2,D5:2 A4:2,B4:2 C5:2,G4:2 A4:2,D5:2 B4:2,C5:2 D5:2,A4:2 C5:2,D5:2 E5:2,B4:2 D5:2,A4:2 B4:2,C#5:2 D5',
  2,
)

test('Fux’s figure 5, move by move', () => {
  const motions = listMotions(FUX_5.exercise, FUX_5.line)
  expect(motions.map(({ bar, motion }) => `${bar} ${motion}`)).toEqual([
    '2 oblique',
    '3 parallel',
    '4 contrary',
    '5 similar',
    '6 contrary',
    '7 oblique',
    '8 parallel',
    '9 contrary',
    '10 parallel',
    '11 contrary',
  ])
  const { moves, counts, shares } = shareMotions(motions)
  expect(moves).toBe(10)
  expect(counts).toEqual({ contrary: 4, oblique: 2, similar: 1, parallel: 3, still: 0 })
  expect(shares.contrary).toBeCloseTo(0.4)
})

test('the motion into a bar starts from the last note of the bar before', () => {
  const motions = listMotions(FUX_33.exercise, FUX_33.line)
  // Bar 1 ends on D5 and bar 2 begins on A4, under which the cantus rises from D4 to F4.
  expect(motions[0]).toEqual({ fromBar: 1, bar: 2, motion: 'contrary' })
  expect(motions).toHaveLength(10)
})

test('bars set aside are not read, and motion goes over them', () => {
  const motions = listMotions(FUX_5.exercise, FUX_5.line, new Set([2, 3, 4]))
  expect(motions[0]).toEqual({ fromBar: 1, bar: 5, motion: 'similar' })
})

test('an unwritten bar and a rest part what stands on their sides', () => {
  const { exercise, line } = read('D4 E4 F4 G4 F4', 'A4 . D5 r:4 A4')
  expect(listMotions(exercise, line)).toEqual([])
})

test('neither voice moving is still', () => {
  const { exercise, line } = read('D4 D4 E4', 'A4 A4 G4')
  expect(listMotions(exercise, line).map(({ motion }) => motion)).toEqual(['still', 'contrary'])
})

describe('voice exchanges', () => {
  test('between neighbouring bars, in any octave', () => {
    const { exercise, line } = read('D4 F4 E4', 'F5 D5 G4')
    expect(findVoiceExchanges(exercise, line)).toEqual([
      { fromBar: 1, toBar: 2, notes: ['D', 'F'], isPassing: false },
    ])
  })

  test('with a passing note between: sixth, octave, tenth', () => {
    const { exercise, line } = read('F4 E4 D4', 'D5 E5 F5')
    expect(findVoiceExchanges(exercise, line)).toEqual([
      { fromBar: 1, toBar: 3, notes: ['F', 'D'], isPassing: true },
    ])
  })

  test('not where a voice turns on the way, nor where both hold one note', () => {
    const turning = read('F4 G4 D4', 'D5 E5 F5')
    expect(findVoiceExchanges(turning.exercise, turning.line)).toEqual([])
    const octaves = read('D4 D4 D4', 'D5 D5 D5')
    expect(findVoiceExchanges(octaves.exercise, octaves.line)).toEqual([])
  })

  test('appear in a reduction that sets the bars between aside', () => {
    const { exercise, line } = read('F4 A4 G4 D4', 'D5 C5 E5 F5')
    expect(findVoiceExchanges(exercise, line)).toEqual([])
    expect(findVoiceExchanges(exercise, line, new Set([2, 3]))).toHaveLength(1)
  })
})

describe('runs of parallel imperfect consonances', () => {
  test('each as long as it lasts, thirds and sixths apart', () => {
    const { exercise, line } = read('D4 E4 F4 G4 F4 E4 D4', 'F4 G4 A4 E5 D5 C5 D5')
    expect(findParallelRuns(exercise, line)).toEqual([
      { fromBar: 1, toBar: 3, interval: 'thirds', length: 3 },
      { fromBar: 4, toBar: 6, interval: 'sixths', length: 3 },
    ])
  })

  test('not fifths, not contrary motion from third to tenth, not a standing third', () => {
    const { exercise, line } = read('D4 E4 G4 D4 D4', 'A4 B4 B4 F5 F5')
    expect(findParallelRuns(exercise, line)).toEqual([])
  })
})

test('the shape of a line of halves: apexes, leaps and their answers, steps', () => {
  const shape = findShape(FUX_33.exercise.cantus.length, FUX_33.line)
  expect(shape).toMatchObject({ apexes: [{ bar: 8, place: 0 }], repeats: 0 })
  expect([shape!.lowest, shape!.highest].map(formatPitch)).toEqual(['G4', 'E5'])
  expect(
    shape!.leaps.map(
      ({ from, to, interval, recovery }) =>
        `${formatPitch(from.pitch)}–${formatPitch(to.pitch)} ${formatInterval(interval)} ${recovery}`,
    ),
  ).toEqual([
    'A4–D5 P4 turns-back',
    'D5–A4 P4 step-back',
    'C5–G4 P4 step-back',
    'A4–D5 P4 turns-back',
    'D5–B4 m3 step-back',
    'D5–A4 P4 turns-back',
    'A4–C5 m3 none',
    'E5–B4 P4 turns-back',
    'B4–D5 m3 turns-back',
    'D5–A4 P4 step-back',
  ])
})

test('a tied note is one note of the shape', () => {
  const { exercise, line } = read('D4 F4 E4', 'r:2,D5:2~ D5:2,C5:2~ C5:2,B4:2', 4)
  const shape = findShape(exercise.cantus.length, line)
  expect(shape).toMatchObject({ steps: 2, repeats: 0, apexes: [{ bar: 1, place: 960 }] })
})

test('nothing written has no shape, and no motion', () => {
  const analysis = analyseLine(FUX_5.exercise, {})
  expect(analysis.shape).toBeNull()
  expect(analysis.motionShares.shares.contrary).toBe(0)
  expect(analysis.sonorities).toEqual({ perfect: 0, imperfect: 0, dissonant: 0 })
})

test('Fux’s figure 5 has four perfect and seven imperfect sonorities', () => {
  expect(analyseLine(FUX_5.exercise, FUX_5.line).sonorities).toEqual({
    perfect: 4,
    imperfect: 7,
    dissonant: 0,
  })
})

test(`of any line: moves add up, runs and exchanges lie in what is read (seed ${SEED})`, () => {
  fc.assert(
    fc.property(
      anyExercise(8),
      anyLine(8),
      someBars(8, 3),
      someBars(8, 3),
      (exercise, whole, gone, aside) => {
        const line = without(whole, gone)
        const { motions, motionShares, parallelRuns, voiceExchanges } = analyseLine(exercise, line, aside)
        const total = Object.values(motionShares.counts).reduce((sum, count) => sum + count, 0)
        expect(total).toBe(motions.length)
        for (const { fromBar, toBar } of [...parallelRuns, ...voiceExchanges]) {
          expect(fromBar).toBeLessThan(toBar)
          for (let bar = fromBar; bar <= toBar; bar += 1) expect(gone.has(bar) && !aside.has(bar)).toBe(false)
        }
        // Runs are maximal, and so share no bar but as the end of one and the beginning of another kind.
        for (const [index, run] of parallelRuns.entries()) {
          const before = parallelRuns[index - 1]
          if (before) expect(run.fromBar).toBeGreaterThan(before.toBar)
        }
      },
    ),
    { seed: SEED, numRuns: 500 },
  )
})
