import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, lowerOf, sonorityOf, upperOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES, goOn } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { comparePitches } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  brief: z.int().min(0).max(12).default(0).describe('Notes in a row that may lie crossed.'),
})
type Params = z.infer<typeof PARAMS>

/** The sonorities that have just lain crossed; one more than the limit is kept at most. */
type State = Readonly<{ exercise: Exercise; crossed: readonly Sonority[] }>
const NONE: readonly Sonority[] = []

export const voiceCross: Rule<State, Params> = {
  id: 'voice-cross',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  start: (exercise) => ({ exercise, crossed: NONE }),
  step: ({ exercise, crossed }, moment, { brief }) => {
    const now = sonorityOf(moment)
    const isCrossed =
      now !== null && comparePitches(upperOf(now, exercise.position), lowerOf(now, exercise.position)) < 0
    if (!isCrossed) return goOn({ exercise, crossed: NONE })
    const run = brief === 0 ? [now] : [...crossed.slice(-brief), now]
    const code = exercise.position === 'above' ? 'under' : 'over'
    return {
      state: { exercise, crossed: run },
      breach: run.length > brief ? breachAt(code, run) : null,
    }
  },
  finish: () => null,
  key: ({ crossed }) => crossed.length,
  explain: {
    title: 'No crossing',
    statement: 'The upper voice does not go below the lower voice.',
    why: 'When the voices change places the listener loses track of which is which.',
    mends: 'Keep the line on its own side of the cantus.',
    sources: cite('OMT1', 'RUSH I', 'DAVD', 'LEHM I–II', 'CHER r3, r15', 'NOTAV II', 'EX'),
    disagreement:
      'An error in today’s textbooks. Cherubini and other older schools allow it in need, if it is consonant and brief, and Fux does it himself.',
    right: {
      cantus: 'D4 F4 G4 F4 E4 D4',
      line: 'A4 A4 B4 A4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 F4 G4 F4 E4 D4',
      line: 'D4 D4 E4 A4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [2, 3],
    },
    messages: {
      under: 'The line goes below the cantus.',
      over: 'The line goes above the cantus.',
    },
  },
}
