import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Rule } from '@/shared/rules/rule'
import { shortExample, SHORT_LINE } from '@/shared/rules/third-species/examples'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import { moves, THIRD_SPECIES, type Moves } from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  allowed: z
    .boolean()
    .default(true)
    .describe('Whether a perfect fourth and a diminished fifth may pass one after the other.'),
})
type Params = z.infer<typeof PARAMS>

export const s3DoublePassing: Rule<Moves, Params> = {
  id: 's3-double-passing',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...moves<Params>((state, now, { params: { allowed } }) => {
    if (figureAt(state, now) !== 'double-passing') return null
    const before = state.before as Sonority
    if (allowed && isPair(before, now)) return null
    const args = { first: nameOf(before), second: nameOf(now) }
    return breachAt(allowed ? 'other-pair' : 'not-allowed', notesOf(state, now), args)
  }),
  explain: {
    title: 'Two passing dissonances in a row',
    statement:
      'Two dissonances follow each other in one run only as a perfect fourth and a diminished fifth, in either order.',
    why: 'One dissonance is covered by the consonances on both sides. Of two in a row one has to stand uncovered; fourth and diminished fifth lie so near to consonance that they are let pass.',
    mends: 'Begin the run on another note, so that its dissonances do not touch.',
    sources: cite('OMT1', 'WIKI'),
    disagreement: 'Only these two sources list it; for the others one of the two notes must be consonant.',
    right: shortExample(SHORT_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 D5:1,C5:1,B4:1,Bb4:1 G4:1,A4:1,Bb4:1,C#5:1 D5', [3], {
      params: { allowed: false },
    }),
    messages: {
      'not-allowed': 'Two dissonances pass one after the other, a {first} and a {second}.',
      'other-pair':
        'Two dissonances pass one after the other, a {first} and a {second}; only a perfect fourth and a diminished fifth may.',
    },
  },
}

const isFourth = ({ simpleSteps, simpleSemitones }: Sonority): boolean =>
  simpleSteps === 3 && simpleSemitones === 5
const isDiminishedFifth = ({ simpleSteps, simpleSemitones }: Sonority): boolean =>
  simpleSteps === 4 && simpleSemitones === 6

const isPair = (one: Sonority, other: Sonority): boolean =>
  (isFourth(one) && isDiminishedFifth(other)) || (isDiminishedFifth(one) && isFourth(other))
