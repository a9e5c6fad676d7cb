import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import { quarterOf, THIRD_SPECIES } from '@/shared/rules/third-species/folds'
import { owing, type OwingState, type Verdict } from '@/shared/rules/third-species/owing'

const PARAMS = z.strictObject({
  allowed: z.boolean().default(true).describe('Whether the figure is allowed at all.'),
  order: z
    .enum(['either', 'upper-first', 'lower-first'])
    .default('either')
    .describe('Which of the two neighbours comes first.'),
})
type Params = z.infer<typeof PARAMS>

export const s3DoubleNeighbour: Rule<OwingState, Params> = {
  id: 's3-double-neighbour',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...owing<Params>(
    (moves, now, { params: { allowed, order } }): Verdict => {
      if (figureAt(moves, now) !== 'double-neighbour') return null
      const notes = notesOf(moves, now)
      const tell = (code: string): Verdict => ({ breach: breachAt(code, notes) })
      if (!allowed) return tell('not-allowed')
      if (quarterOf(moves.before as Sonority) !== 2) return tell('misplaced')
      if (order !== 'either' && (order === 'upper-first') !== moves.entry > 0) return tell('other-order')
      return { debt: { way: moves.entry, steps: 2, notes } }
    },
    (debt, isStep, now) =>
      isStep
        ? null
        : breachAt(debt.notes.length === 3 ? 'not-closed' : 'not-continued', [...debt.notes, now]),
  ),
  explain: {
    title: 'The double neighbour',
    statement:
      'A third between two dissonances is allowed only in the double neighbour: the first and fourth quarters are one note, the second and third the steps on either side of it, and the line goes on by step the way it moved last.',
    why: 'The two neighbours circle round a note that is consonant, and the ear hears that note all through the bar.',
    mends: 'Come back to the note of the first quarter and go on by step; or fill the third with a step.',
    sources: cite('OMT1', 'RUSH III', 'FLASH', 'WIKI', 'DAVID', 'EX'),
    disagreement: 'The sources of the eighteenth century do not list it, and Fux never writes it.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,C4:1,F4:1 A4:1,B4:1,C5:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [1]),
    messages: {
      'not-allowed':
        'The line leaps a third round a note as a double neighbour, which this rule set does not have.',
      'not-allowed.mend': 'Fill the third with a step.',
      misplaced: 'The double neighbour does not begin on the first quarter.',
      'other-order': 'The double neighbour takes its two notes in the other order than it may.',
      'not-closed': 'The double neighbour does not come back to the note it began with.',
      'not-continued': 'After the double neighbour the line does not go on by step the same way.',
    },
  },
}
