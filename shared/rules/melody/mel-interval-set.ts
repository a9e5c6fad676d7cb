import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldPairs, spanArgs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  set: z
    .enum(['strict', 'consonances', 'no-major-sixth', 'broad'])
    .default('strict')
    .describe(
      'strict: seconds, thirds, fourth, fifth and octave, and the minor sixth upward. consonances: seconds and every consonant leap, both sixths both ways. no-major-sixth: as consonances without the major sixth. broad: everything but sevenths, what is wider than an octave, and what is augmented or chromatic.',
    ),
  diminishedFifth: z.boolean().default(false).describe('Whether the set also holds the diminished fifth.'),
  leaveSixths: z.boolean().default(false).describe('Leaves sixths to the rule that speaks of sixths.'),
})
type Params = z.infer<typeof params>

/** Semitones of minor and major, or of perfect twice, by steps: second to octave. */
const PLAIN: readonly (readonly [number, number])[] = [
  [0, 0],
  [1, 2],
  [3, 4],
  [5, 5],
  [7, 7],
  [8, 9],
  [10, 11],
  [12, 12],
]

function isInSet(steps: number, semitones: number, { set, diminishedFifth, leaveSixths }: Params): boolean {
  const size = Math.abs(steps)
  const width = steps < 0 ? -semitones : semitones
  if (size === 0) return semitones === 0
  if (size === 5 && leaveSixths) return true
  if (size === 4 && width === 6) return diminishedFifth || set === 'broad'
  const plain = PLAIN[size]
  if (plain === undefined || size === 6) return false
  const [narrow, wide] = plain
  if (set === 'broad') return width <= wide
  if (width !== narrow && width !== wide) return false
  if (size !== 5 || set === 'consonances') return true
  return width === narrow && (set === 'no-major-sixth' || steps > 0)
}

export const melIntervalSet: Rule<OneBehind, Params> = {
  id: 'mel-interval-set',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, given, { voice }) => {
    const steps = stepsFrom(before.note, now.note)
    const semitones = semitonesFrom(before.note, now.note)
    if (isInSet(steps, semitones, given)) return null
    const code = steps > 0 ? 'up' : steps < 0 ? 'down' : 'same-letter'
    return breachAt(voice, code, [before, now], spanArgs(before, now))
  }),
  explain: {
    title: 'Singable intervals only',
    statement:
      'From one note to the next a line moves by a second, third, fourth, fifth or octave, and upward by a minor sixth; how many of the sixths are allowed differs.',
    why: 'These are the intervals a choir finds without an instrument. The others are hard to hit, and pull the line apart.',
    mends: 'Fill the leap with steps, or aim for a note that makes a third, fourth or fifth.',
    sources: [
      { source: 'MANNF' },
      { source: 'HSR', place: 'hard rule 2' },
      { source: 'E2', place: 'section 1' },
      { source: 'OMT1' },
      { source: 'BRIDGE', place: 'ch. 1, rules 1–5' },
      { source: 'LEHM', place: 'lesson I' },
      { source: 'JEPP', fromMemory: true },
    ],
    right: { cantus: 'D4 A4 G4 C4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 B4 A4 B3 D4', mode: 'dorian', final: 'D', breaches: [2, 4] },
    messages: {
      up: 'The line rises a {interval}, {from} to {to}, which is not among the allowed intervals.',
      down: 'The line falls a {interval}, {from} to {to}, which is not among the allowed intervals.',
      'same-letter': 'From {from} to {to} is a chromatic step, which is not among the allowed intervals.',
    },
    disagreement: 'The sources draw the set wider or narrower; the sixths divide them most.',
  },
}
