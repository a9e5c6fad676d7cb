import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import { moves, quarterOf, THIRD_SPECIES, type Moves } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  allowed: z
    .enum(['no', 'lower', 'yes'])
    .default('no')
    .describe('Dissonant neighbour notes: none; only those below; all.'),
  onThird: z.boolean().default(false).describe('Where they are allowed: on the third quarter as well.'),
})
type Params = z.infer<typeof PARAMS>

export const s3Neighbour: Rule<Moves, Params> = {
  id: 's3-neighbour',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...moves<Params>((state, now, { params: { allowed, onThird } }) => {
    if (figureAt(state, now) !== 'neighbour') return null
    const at = state.before as Sonority
    const args = { interval: nameOf(at) }
    if (state.entry > 0 ? allowed !== 'yes' : allowed === 'no') {
      return breachAt(state.entry > 0 ? 'upper' : 'lower', notesOf(state, now), args)
    }
    return quarterOf(at) === 3 && !onThird ? breachAt('on-third', notesOf(state, now), args) : null
  }),
  explain: {
    title: 'Dissonant neighbour notes',
    statement: 'A dissonance does not step out and back to the same note.',
    why: 'A passing note goes somewhere. A neighbour goes out and comes back, and leaves only its dissonance in the ear.',
    mends: 'Pass on in the same direction, or make the neighbour a consonance.',
    sources: cite('OMT1', 'RUSH III', 'FLASH', 'DAVID', 'LEHM IV', 'SOLON', 'FUX°', 'JEPP°', 'EX'),
    disagreement:
      'Five sources allow neighbours on the weak quarters, one of them sparingly; one school only those below; others none, and Fux writes none.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,D4:1,F4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [1]),
    messages: {
      upper: 'The {interval} is a dissonance that steps up and back, an upper neighbour.',
      lower: 'The {interval} is a dissonance that steps down and back, a lower neighbour.',
      'on-third':
        'The {interval} on the third quarter is a dissonant neighbour, which belongs on a weak quarter.',
    },
  },
}
