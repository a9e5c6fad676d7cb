import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldNotes, type Frame } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch, formatPitchClass } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf, isFinal } from '@/shared/theory/scale'

const params = z.strictObject({
  allowDominant: z.boolean().default(false).describe('Whether the fifth degree will do for a beginning.'),
})
type Params = z.infer<typeof params>

export const cfStartFinal: Rule<Frame, Params> = {
  id: 'cf-start-final',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  ...foldNotes<Params>((now, { allowDominant }, { exercise, voice }) => {
    const { mode, final } = exercise
    if (!now.isFirst || isFinal(now.note, final)) return null
    const isDominant = degreeOf(now.note, final) === 5 && alterationInMode(now.note, mode, final) === 0
    if (allowDominant && isDominant) return null
    return breachAt(voice, 'not-on-final', [now], {
      note: formatPitch(now.note),
      final: formatPitchClass(final),
    })
  }),
  explain: {
    title: 'Begin on the final',
    statement: 'The cantus begins on the final of its mode.',
    why: 'The first note tells the ear which mode it is in. Starting anywhere else names another home.',
    mends: 'Start on the final, or put it before the first note.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'CFH', place: 'rule 2' },
      { source: 'VIGIL' },
      { source: 'ECR', place: 'rule 3' },
      { source: 'BRIDGE', place: 'ch. 7' },
    ],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'F4 G4 E4 D4', mode: 'dorian', final: 'D', breaches: [1] },
    messages: { 'not-on-final': 'The cantus begins on {note}; its final is {final}.' },
    disagreement: 'Bridge knows canti firmi that begin on the dominant.',
  },
}
