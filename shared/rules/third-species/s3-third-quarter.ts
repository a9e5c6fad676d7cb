import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import type { Breach, Rule } from '@/shared/rules/rule'
import { stepsTo } from '@/shared/rules/second-species/folds'
import { shortExample, ACCENTED_LINE } from '@/shared/rules/third-species/examples'
import { figureAt, notesOf } from '@/shared/rules/third-species/figures'
import {
  isWeakDissonance,
  moves,
  quarterOf,
  THIRD_SPECIES,
  type Moves,
} from '@/shared/rules/third-species/folds'

const PARAMS = z.strictObject({
  dissonance: z
    .enum(['between-consonances', 'by-step', 'descending', 'never'])
    .default('between-consonances')
    .describe(
      'When the third quarter may be a dissonance: when the second and fourth are consonant; whenever it goes by step; only falling; never.',
    ),
})
type Params = z.infer<typeof PARAMS>

/** That the dissonance goes by step is the matter of `s3-dissonance-step`; two in one run that of `s3-double-passing`. */
export const s3ThirdQuarter: Rule<Moves, Params> = {
  id: 's3-third-quarter',
  level: 'law',
  scope: 'pair',
  species: THIRD_SPECIES,
  params: PARAMS,
  ...moves<Params>((state, now, { params: { dissonance } }) => {
    if (dissonance === 'between-consonances') return judgeNeighbours(state, now)
    if (dissonance === 'by-step' || quarterOf(now) !== 3 || !isWeakDissonance(now)) return null
    const args = { interval: nameOf(now) }
    if (dissonance === 'never') return breachAt('dissonant', [now], args)
    const { before } = state
    return before !== null && stepsTo(before, now) === 1 ? breachAt('rises', [before, now], args) : null
  }),
  explain: {
    title: 'The third quarter',
    statement:
      'The third quarter is a consonance, unless it is a passing note between a consonant second and a consonant fourth quarter.',
    why: 'It is the second strongest place of the bar. A dissonance there is covered only when both of its neighbours are consonant.',
    mends: 'Make the third quarter a consonance, or both of its neighbours.',
    sources: cite('FUX°', 'SEQ', 'NOTAV III-ii', 'RUSH III', 'DAVID', 'OMT1', 'FLASH', 'JEPP°', 'EX'),
    disagreement:
      'One textbook lets every quarter but the first be a dissonance by step; one school only a falling one, though ten of the eleven in Fux rise; others none.',
    right: shortExample(ACCENTED_LINE),
    wrong: shortExample('D4:1,E4:1,F4:1,G4:1 A4:1,B4:1,Bb4:1,A4:1 G4:1,A4:1,B4:1,C#5:1 D5', [2]),
    messages: {
      'after-dissonance':
        'The {interval} on the third quarter is a dissonance, and so is the note before it.',
      'before-dissonance': 'The third quarter is a dissonance, and so is the {interval} after it.',
      rises: 'The {interval} on the third quarter is a dissonance and is reached by a rising step.',
      'rises.mend': 'Let the dissonance fall by step, or make the third quarter a consonance.',
      dissonant: 'The {interval} on the third quarter is a dissonance.',
      'dissonant.mend': 'Make the third quarter a consonance.',
    },
  },
}

function judgeNeighbours(state: Moves, now: Sonority): Breach | null {
  const { before } = state
  if (before === null || !isWeakDissonance(before) || !isWeakDissonance(now)) return null
  const figure = figureAt(state, now)
  if (figure === 'double-passing' || figure === 'double-neighbour') return null
  const args = { interval: nameOf(now) }
  if (quarterOf(now) === 3) return breachAt('after-dissonance', notesOf(state, now), args)
  return quarterOf(before) === 3 ? breachAt('before-dissonance', notesOf(state, now), args) : null
}
