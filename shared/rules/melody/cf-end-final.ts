import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldNotes, type Frame } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch, formatPitchClass } from '@/shared/theory/pitch'
import { isFinal } from '@/shared/theory/scale'

const params = z.strictObject({})
type Params = z.infer<typeof params>

export const cfEndFinal: Rule<Frame, Params> = {
  id: 'cf-end-final',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  ...foldNotes<Params>((now, _params, { exercise, voice }) => {
    if (!now.isLast || isFinal(now.note, exercise.final)) return null
    return breachAt(voice, 'not-on-final', [now], {
      note: formatPitch(now.note),
      final: formatPitchClass(exercise.final),
    })
  }),
  explain: {
    title: 'End on the final',
    statement: 'The cantus ends on the final of its mode.',
    why: 'The final is the one note on which the mode comes to rest; any other leaves the line hanging.',
    mends: 'Lead the last notes down (or up) by step to the final.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'CFH', place: 'rule 2' },
      { source: 'VIGIL' },
      { source: 'ECR', place: 'rule 3' },
    ],
    right: { cantus: 'D4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 G4 F4', mode: 'dorian', final: 'D', breaches: [4] },
    messages: { 'not-on-final': 'The cantus ends on {note}; its final is {final}.' },
  },
}
