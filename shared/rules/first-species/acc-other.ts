import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { ALL_SPECIES, breachAt, foldNotes, type Frame } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { formatPitch } from '@/shared/theory/pitch'
import { alterationInMode, degreeOf, isRaisedSeventh } from '@/shared/theory/scale'
import { usualFlatDegree } from '@/shared/theory/usual-flat'

const PARAMS = z.strictObject({
  bFlat: z.boolean().default(true).describe('B flat, or its like in a transposed mode, is free.'),
  raised: z
    .enum(['anywhere', 'seventh-before-the-close'])
    .default('anywhere')
    .describe('Where the raised degrees of the close are left to other rules: anywhere; or judged here.'),
})
type Params = z.infer<typeof PARAMS>

export const accOther: Rule<Frame, Params> = {
  id: 'acc-other',
  level: 'preference',
  scope: 'line',
  species: ALL_SPECIES,
  params: PARAMS,
  ...foldNotes<Params>((now, params, { exercise: { mode, final } }) => {
    const alteration = alterationInMode(now.note, mode, final)
    if (alteration === 0) return null
    const degree = degreeOf(now.note, final)
    if (params.bFlat && alteration === -1 && degree === usualFlatDegree(mode)) return null
    const isAtClose = params.raised === 'anywhere' || now.isPenultimate
    if (isAtClose && isRaisedSeventh(now.note, mode, final)) return null
    const isRaisedSixth = mode === 'aeolian' && degree === 6 && alteration === 1
    if (params.raised === 'anywhere' && isRaisedSixth) return null
    return breachAt('line', 'foreign', [now], { note: formatPitch(now.note) })
  }),
  explain: {
    title: 'No other accidentals',
    statement:
      'Beside the raised degrees of the close and the B flat that avoids a tritone with F, the line keeps to the notes of its mode.',
    why: 'Every foreign note weakens the mode. The few that are usual have their reasons: to close firmly, or to sing without a tritone.',
    mends: 'Take the note without its accidental, or the one beside it.',
    sources: cite('DAVD', 'OMT1', 'JEPP°', 'EX'),
    disagreement:
      'Fux writes B flat in Dorian and Lydian; two courses allow no accidental but those of the close.',
    right: { cantus: 'D4 E4 D4 E4 D4', line: 'A4 G4 B4 C#5 D5', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 E4 D4 E4 D4', line: 'A4 G4 F#4 C#5 D5', mode: 'dorian', final: 'D', breaches: [3] },
    messages: { foreign: 'The {note} is not a note of the mode.' },
  },
}
