import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, isDissonance, nameOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { shapeOfUpbeat } from '@/shared/rules/second-species/dissonant-upbeat'
import { passingExample, PASSING_LINE } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES, stepsTo, weakNotes, type WeakState } from '@/shared/rules/second-species/folds'
import { semitonesFrom } from '@/shared/theory/interval'

const NO_LIMIT = 99

const PARAMS = z.strictObject({
  allowed: z
    .enum(['no', 'upper-or-semitone-below', 'yes'])
    .default('no')
    .describe('Dissonant neighbour notes: none; those above, and below those a semitone away; all.'),
  most: z
    .int()
    .min(0)
    .max(NO_LIMIT)
    .default(NO_LIMIT)
    .describe('How many a line may have, where they are allowed.'),
})
type Params = z.infer<typeof PARAMS>

/** `used` counts the neighbours that were let pass, where there is a limit to them. */
type State = Readonly<{ weak: WeakState; used: number }>

const FOLD = weakNotes<Params>(isDissonance, (from, at, to, { params }) => {
  if (from === null || to === null || shapeOfUpbeat(from, at, to) !== 'neighbour') return null
  const code = isGood(from, at, params) ? 'too-many' : stepsTo(from, at) > 0 ? 'upper' : 'lower'
  return breachAt(code, [from, at, to], { interval: nameOf(at) })
})

function isGood(from: Sonority, at: Sonority, { allowed }: Params): boolean {
  if (allowed !== 'upper-or-semitone-below') return allowed === 'yes'
  return stepsTo(from, at) > 0 || semitonesFrom(from.note, at.note) === -1
}

export const s2Neighbour: Rule<State, Params> = {
  id: 's2-neighbour',
  level: 'law',
  scope: 'pair',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: (exercise, params, voice) => ({ weak: FOLD.start(exercise, params, voice), used: 0 }),
  step: ({ weak, used }, moment, params) => {
    const { state, breach } = FOLD.step(weak, moment, params)
    if (breach?.code !== 'too-many') return { state: { weak: state, used }, breach }
    if (used >= params.most) return { state: { weak: state, used }, breach }
    // Where there is no limit their number does not matter.
    return goOn({ weak: state, used: params.most === NO_LIMIT ? 0 : used + 1 })
  },
  finish: () => null,
  key: ({ weak, used }) => pack([used, 128], [FOLD.key(weak), 2 ** 29]),
  explain: {
    title: 'Dissonant neighbour notes',
    statement: 'A dissonance in the second half of a bar does not step out and back to the same note.',
    why: 'A passing note goes somewhere. A neighbour goes out and comes back, and leaves only its dissonance in the ear.',
    mends: 'Pass on in the same direction, or make the neighbour a consonance.',
    sources: cite('OMT1', 'FUXE', 'GROVE', 'FLASH', 'NOTAV II-i-2', 'LEHM II', 'RATIO', 'DAVD', 'EX'),
    disagreement:
      'The older books and one open textbook leave it out, and Fux never writes it; three schools allow it, one only a semitone below or any note above; one course rarely.',
    right: passingExample(PASSING_LINE),
    wrong: passingExample('r:2,D5:2 B4:2,A4:2 B4:2,G4:2 B4:2,C#5:2 D5', [3]),
    messages: {
      upper: 'The {interval} is a dissonance that steps up and back, an upper neighbour.',
      lower: 'The {interval} is a dissonance that steps down and back, a lower neighbour.',
      'too-many': 'The line has one more dissonant neighbour, a {interval}, and has had enough of them.',
    },
  },
}
