import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { STRUCK_SPECIES, downbeats, type NeighbourState } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  cantusMove,
  degreeIn,
  lineMove,
  lowerOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'

const PARAMS = z.strictObject({
  scope: z
    .enum(['everywhere', 'major-modes', 'degrees-4-5'])
    .default('everywhere')
    .describe(
      'Everywhere; in modes with a major third over the final; or only over the fourth and fifth degrees.',
    ),
})
type Params = z.infer<typeof PARAMS>

const MAJOR_MODES: ReadonlySet<string> = new Set(['ionian', 'lydian', 'mixolydian'])

export const majorThirdsRun: Rule<NeighbourState, Params> = {
  id: 'major-thirds-run',
  level: 'preference',
  scope: 'pair',
  species: STRUCK_SPECIES,
  params: PARAMS,
  ...downbeats<Params>((before, now, { exercise, params: { scope } }) => {
    if (!isMajorThird(before) || !isMajorThird(now)) return null
    // A third held, or one that only changes its octave, makes no new pair.
    if (lineMove(before, now) === 0 || cantusMove(before, now) === 0) return null
    if (scope === 'major-modes' && !MAJOR_MODES.has(exercise.mode)) return null
    if (scope === 'degrees-4-5') {
      const degrees = [before, now].map((one) => degreeIn(lowerOf(one, exercise.position), exercise))
      if (!degrees.includes(4) || !degrees.includes(5)) return null
    }
    return breachAt('two', [before, now])
  }),
  explain: {
    title: 'Not two major thirds in a row',
    statement: 'Two major thirds do not follow each other, above all over the fourth and fifth degrees.',
    why: 'Between the lower note of one and the upper note of the next lies a tritone: F–A to G–B sets F against B.',
    mends: 'Go to a sixth, a fifth or a minor third instead.',
    sources: cite('LEHM I', 'NOTAV I-iv', 'EX Figs 44, 88a'),
    disagreement:
      'Today’s American textbooks do not mention it; one source forbids it only on the fourth and fifth degrees.',
    right: { cantus: 'C4 F4 E4 D4 C4', line: 'G4 A4 C5 B4 C5', mode: 'ionian', final: 'C', breaches: [] },
    wrong: { cantus: 'C4 F4 G4 D4 C4', line: 'G4 A4 B4 B4 C5', mode: 'ionian', final: 'C', breaches: [3] },
    messages: { two: 'Two major thirds follow each other.' },
  },
}

const isMajorThird = ({ simpleSteps, simpleSemitones }: Sonority): boolean =>
  simpleSteps === 2 && simpleSemitones === 4
