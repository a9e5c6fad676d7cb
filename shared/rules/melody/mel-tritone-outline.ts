import { z } from 'zod'
import { ALL_SPECIES, asRemark, breachAt, spanArgs } from '@/shared/rules/fold'
import { foldTurningPoints, type Outline } from '@/shared/rules/melody/turning-points'
import type { Rule } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  diminishedFifth: z
    .enum(['allow', 'remark', 'ban'])
    .default('remark')
    .describe('The diminished fifth: let pass, reported as a remark, or treated as the augmented fourth is.'),
})
type Params = z.infer<typeof params>

export const melTritoneOutline: Rule<Outline, Params> = {
  id: 'mel-tritone-outline',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldTurningPoints<Params>((from, to, { diminishedFifth }, voice) => {
    if (Math.abs(semitonesFrom(from.note, to.note)) !== 6) return null
    const size = Math.abs(stepsFrom(from.note, to.note))
    if (size === 3) return breachAt(voice, 'augmented-fourth', [from, to], spanArgs(from, to))
    if (size !== 4 || diminishedFifth === 'allow') return null
    const breach = breachAt(voice, 'diminished-fifth', [from, to], spanArgs(from, to))
    return diminishedFifth === 'remark' ? asRemark(breach) : breach
  }),
  explain: {
    title: 'No tritone between turning points',
    statement:
      'Motion in one direction is not bounded by a tritone: the notes where the line turns do not stand an augmented fourth apart.',
    why: 'The notes where a line turns stay in the ear and are compared. The tritone between them is heard as if it were leapt.',
    mends:
      'Carry the motion one note further, or turn one note earlier; or flatten B where the style allows it.',
    sources: [
      { source: 'GROVE', place: 'third order' },
      { source: 'NOTAV', place: 'III-iv' },
      { source: 'CCC', place: 'rule 2' },
      { source: 'HSR', place: 'hard rule 3c' },
      { source: 'FUX', fromMemory: true },
    ],
    right: { cantus: 'D4 F4 G4 A4 B4 C5 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'A4 F4 G4 A4 B4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [5] },
    messages: {
      'augmented-fourth': 'The line turns at {from} and at {to}, an augmented fourth apart.',
      'diminished-fifth': 'The line turns at {from} and at {to}, a diminished fifth apart.',
    },
    disagreement: 'Whether the diminished fifth is as bad is disputed; most texts speak only of the fourth.',
  },
}
