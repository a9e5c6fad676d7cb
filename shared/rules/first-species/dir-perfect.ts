import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { FIRST_SPECIES, neighbours, type NeighbourState } from '@/shared/rules/first-species/folds'
import {
  breachAt,
  cantusSpan,
  degreeIn,
  isThird,
  lineSpan,
  lowerOf,
  perfectKindOf,
  sharedDirection,
  sizeOf,
  upperOf,
  type Sonority,
} from '@/shared/rules/first-species/sonority'
import type { Exercise, Rule } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

/**
 * What schools let pass. `upper-step`: the upper voice steps. `either-step`: one of the voices steps. `rising-semitone`:
 * an octave, the upper voice rising a semitone. `tonic-dominant`: the lower voice goes between the first and fifth
 * degrees. `leading-third`: from a third over the leading tone to a fifth over the final.
 */
const EXCEPTIONS = [
  'upper-step',
  'either-step',
  'rising-semitone',
  'tonic-dominant',
  'leading-third',
] as const
type Exception = (typeof EXCEPTIONS)[number]

const PARAMS = z.strictObject({
  exceptions: z.array(z.enum(EXCEPTIONS)).default([]).describe('Similar motion that is let pass.'),
})
type Params = z.infer<typeof PARAMS>

/** Two perfect consonances of one kind in a row are the matter of `par-perfect`. */
export const dirPerfect: Rule<NeighbourState, Params> = {
  id: 'dir-perfect',
  level: 'law',
  scope: 'pair',
  species: FIRST_SPECIES,
  params: PARAMS,
  ...neighbours<Params>((before, now, { exercise, params }) => {
    const kind = perfectKindOf(now)
    if (kind === null || kind === perfectKindOf(before)) return null
    const direction = sharedDirection(before, now)
    if (direction === 0) return null
    if (params.exceptions.some((exception) => isExcepted(exception, before, now, exercise))) return null
    return breachAt(direction > 0 ? 'rise-into' : 'fall-into', [before, now], { interval: sizeOf(now) })
  }),
  explain: {
    title: 'No similar motion into a fifth or octave',
    statement: 'A fifth, an octave or a unison is not entered by both voices moving the same way.',
    why: 'When both voices run into a perfect consonance the ear fills in the notes between and hears parallel fifths or octaves.',
    mends: 'Come to it from the other side, or let one voice stay.',
    sources: cite(
      'FUXE r1',
      'FUXN',
      'OMT1',
      'RUSH I',
      'LOEFF r3',
      'DAVD',
      'BRIDGE',
      'LEHM',
      'NOTAV I-iii',
      'HSR',
      'EX',
    ),
    disagreement:
      'Many sources allow no exception. Others let it pass when the upper voice steps, when either voice steps, when the upper voice rises a semitone to the octave, or between tonic and dominant.',
    right: {
      cantus: 'D4 E4 F4 G4 E4 D4',
      line: 'A4 C5 C5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [],
    },
    wrong: {
      cantus: 'D4 E4 F4 G4 E4 D4',
      line: 'A4 G4 C5 B4 C#5 D5',
      mode: 'dorian',
      final: 'D',
      breaches: [3],
    },
    messages: {
      'rise-into': 'Both voices rise into a {interval}.',
      'rise-into.mend': 'Come to it from above, or let one voice stay.',
      'fall-into': 'Both voices fall into a {interval}.',
      'fall-into.mend': 'Come to it from below, or let one voice stay.',
    },
  },
}

function isExcepted(exception: Exception, before: Sonority, now: Sonority, exercise: Exercise): boolean {
  const { position } = exercise
  const upperBefore = upperOf(before, position)
  const upper = upperOf(now, position)
  switch (exception) {
    case 'upper-step':
      return Math.abs(stepsFrom(upperBefore, upper)) === 1
    case 'either-step':
      return lineSpan(before, now) === 1 || cantusSpan(before, now) === 1
    case 'rising-semitone':
      return (
        perfectKindOf(now) === 'octave' &&
        stepsFrom(upperBefore, upper) === 1 &&
        semitonesFrom(upperBefore, upper) === 1
      )
    case 'tonic-dominant': {
      const degrees = [before, now].map((sonority) => degreeIn(lowerOf(sonority, position), exercise))
      return degrees.includes(1) && degrees.includes(5)
    }
    case 'leading-third':
      return (
        perfectKindOf(now) === 'fifth' &&
        isThird(before) &&
        degreeIn(lowerOf(before, position), exercise) === 7 &&
        degreeIn(lowerOf(now, position), exercise) === 1
      )
  }
}
