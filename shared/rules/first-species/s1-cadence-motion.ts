import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  cantusMove,
  cantusSpan,
  degreeIn,
  isContrary,
  lineMove,
  lineSpan,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import { ALL_SPECIES } from '@/shared/rules/fold'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { isFinal, isLeadingTone } from '@/shared/theory/scale'

const PARAMS = z.strictObject({
  cantus: z
    .enum(['excused', 'judged'])
    .default('excused')
    .describe(
      'Whether a cantus that leaps to its final, as a reduction may make it, is held against the line.',
    ),
  degrees: z
    .enum(['free', 'leading-tone-and-second'])
    .default('free')
    .describe('Whether the voices must also come from the leading tone and the second degree.'),
})
type Params = z.infer<typeof PARAMS>

export const s1CadenceMotion: Rule<NeighbourState, Params> = {
  id: 's1-cadence-motion',
  level: 'law',
  scope: 'pair',
  species: ALL_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { exercise, params, moment }) => {
    if (!moment.isLast) return null
    if (lineMove(before, now) === 0) return breachAt('stays', [before, now])
    if (lineSpan(before, now) !== 1) return breachAt('leaps', [before, now])
    if (params.cantus === 'judged' && cantusSpan(before, now) !== 1) {
      return breachAt('cantus-leaps', [before, now])
    }
    if (!isContrary(before, now) && (params.cantus === 'judged' || cantusMove(before, now) !== 0)) {
      return breachAt('same-way', [before, now])
    }
    const isFormula = params.degrees === 'free' || isClausulaVera(before, now, exercise)
    return isFormula ? null : breachAt('other-degrees', [before, now])
  }),
  explain: {
    title: 'Into the final by step',
    statement: 'Both voices reach the final by step, one rising and one falling.',
    why: 'A step each way is the gentlest and the firmest arrival. A leap, or two voices going one way, sounds as if the music went on.',
    mends: 'Come to the final by a step, against the direction of the cantus.',
    sources: cite('OMT1', 'LEHM I', 'E2 s1-4g'),
    disagreement: 'One source lets the line leap into its last note now and then.',
    right: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 E4 D4', line: 'A4 A4 G4 D5', mode: 'dorian', final: 'D', breaches: [4] },
    messages: {
      leaps: 'The line leaps into its last note.',
      stays: 'The line stands still into its last note.',
      'same-way': 'Both voices go the same way into the last bar.',
      'cantus-leaps': 'The cantus does not reach its final by step.',
      'other-degrees': 'The voices do not come to the final from the leading tone and the second degree.',
    },
  },
}

/** One voice goes from the second degree and the other from the leading tone, both to the final. */
function isClausulaVera(before: Sonority, now: Sonority, exercise: Exercise): boolean {
  const { mode, final } = exercise
  if (!isFinal(now.note, final) || !isFinal(now.other, final)) return false
  const cantusDegree = degreeIn(before.other, exercise)
  if (cantusDegree === 2) return isLeadingTone(before.note, mode, final)
  return cantusDegree === 7 && degreeIn(before.note, exercise) === 2
}
