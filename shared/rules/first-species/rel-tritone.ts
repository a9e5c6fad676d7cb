import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { acrossBars, type NeighbourState } from '@/shared/rules/first-species/folds'
import { breachAt, cantusSpan, isSixth, lineSpan, type Sonority } from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES, asRemark } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { intervalBetween, simpleInterval } from '@/shared/theory/interval'
import { formatPitchClass, type Pitch } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  bothStep: z
    .enum(['judged', 'remark', 'excused'])
    .default('judged')
    .describe('What is said when both voices move by step.'),
  sonorities: z
    .enum(['any', 'without-sixths'])
    .default('any')
    .describe('Between any sonorities, or only between such as stand for chords in root position.'),
})
type Params = z.infer<typeof PARAMS>

export const relTritone: Rule<NeighbourState, Params> = {
  id: 'rel-tritone',
  level: 'preference',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...acrossBars<Params>((before, now, { params }) => {
    const pair = findTritone(before, now)
    if (pair === null) return null
    if (params.sonorities === 'without-sixths' && (isSixth(before) || isSixth(now))) return null
    const bothStep = lineSpan(before, now) === 1 && cantusSpan(before, now) === 1
    if (bothStep && params.bothStep === 'excused') return null
    const breach = breachAt('against', [before, now], {
      first: formatPitchClass(pair[0]),
      second: formatPitchClass(pair[1]),
    })
    return bothStep && params.bothStep === 'remark' ? asRemark(breach) : breach
  }),
  explain: {
    title: 'Mi against fa',
    statement:
      'F in one voice does not stand directly against B in the other, in sonorities next to each other.',
    why: 'The tritone is not sung by either voice, yet the ear hears it between them.',
    mends: 'Put another sonority between the two, or choose another note for the line.',
    sources: cite('FUXE r5', 'FUXN', 'NOTAV I-iv', 'LEHM I', 'EX'),
    disagreement:
      'Two sources ban it always, one finds it milder when both voices step, one only minds it between chords in root position.',
    right: { cantus: 'C4 F4 E4 D4 C4', line: 'G4 A4 C5 B4 C5', mode: 'ionian', final: 'C', breaches: [] },
    wrong: { cantus: 'C4 F4 G4 D4 C4', line: 'G4 A4 B4 B4 C5', mode: 'ionian', final: 'C', breaches: [3] },
    messages: { against: 'The {first} of one voice stands directly against the {second} of the other.' },
  },
}

/** The two notes across the voices that make the tritone, the earlier first. */
function findTritone(before: Sonority, now: Sonority): readonly [Pitch, Pitch] | null {
  if (isTritone(before.note, now.other)) return [before.note, now.other]
  return isTritone(before.other, now.note) ? [before.other, now.note] : null
}

function isTritone(a: Pitch, b: Pitch): boolean {
  const { steps, semitones } = simpleInterval(intervalBetween(a, b))
  return (steps === 3 || steps === 4) && semitones === 6
}
