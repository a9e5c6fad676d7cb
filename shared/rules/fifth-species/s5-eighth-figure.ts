import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { exampleIn } from '@/shared/rules/example-in'
import { FIFTH_SPECIES, isEighth, isOnQuarter } from '@/shared/rules/fifth-species/folds'
import { breachAt, sonorityOf, type Sonority } from '@/shared/rules/first-species/sonority'
import { goOn, pack, packPitch, PITCH_ROOM } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import type { Pitch } from '@/shared/theory/pitch'

const FIGURES = ['lower-neighbour', 'run', 'upper-neighbour'] as const
const PARAMS = z.strictObject({
  figures: z
    .array(z.enum(FIGURES))
    .default(['lower-neighbour', 'run'])
    .describe(
      'What a pair of eighths may be: a turn to the note below or above, or part of four notes by step.',
    ),
})
type Params = z.infer<typeof PARAMS>

/** The note before a pair, and the eighths of it that have sounded. */
type State = Readonly<{ before: Pitch | null; pair: readonly Sonority[] }>

const example = exampleIn(5, 'D4 F4 E4 D4')

export const s5EighthFigure: Rule<State, Params> = {
  id: 's5-eighth-figure',
  level: 'preference',
  scope: 'pair',
  species: FIFTH_SPECIES,
  params: PARAMS,
  start: () => ({ before: null, pair: [] }),
  step: ({ before, pair }, moment, { figures }) => {
    const now = sonorityOf(moment)
    if (now === null) return goOn({ before: null, pair: [] })
    const [first, second] = pair
    if (first !== undefined && second === undefined && isEighth(now))
      return goOn({ before, pair: [first, now] })
    const isNext = isEighth(now) && isOnQuarter(now)
    const state = { before: isNext ? (second?.note ?? before) : now.note, pair: isNext ? [now] : [] }
    if (first === undefined || second === undefined) return goOn(state)
    const figure = figureOf(before, first.note, second.note, now.note)
    const isKnown = figure !== null && figures.includes(figure)
    return { state, breach: isKnown ? null : breachAt('other', [first, second, now], {}, 'line') }
  },
  finish: () => null,
  key: ({ before, pair: [first, second] }) =>
    pack(
      [packPitch(before), PITCH_ROOM],
      [packPitch(first?.note ?? null), PITCH_ROOM],
      [packPitch(second?.note ?? null), PITCH_ROOM],
    ),
  explain: {
    title: 'What a pair of eighths may be',
    statement:
      'A pair of eighths turns to the note below and back, or is part of four notes that run by step.',
    why: 'These are the figures in which the short notes belong to a longer one; others sound as if they wanted to be a theme.',
    mends:
      'Let the second eighth be the step below the first and come back, or let all four notes go the same way.',
    sources: cite('GIRT', 'JEPP°'),
    right: example('r:2,A4:2~ A4:2,D5:2~ D5:1,C#5:0.5,B4:0.5,C#5:2 D5'),
    wrong: example('r:2,A4:2~ A4:1,B4:0.5,C5:0.5,B4:2~ B4:2,C#5:2 D5', [2]),
    messages: { other: 'These eighths are neither a turn to the note below nor part of a run.' },
  },
}

function figureOf(
  before: Pitch | null,
  first: Pitch,
  second: Pitch,
  after: Pitch,
): (typeof FIGURES)[number] | null {
  const inside = stepsFrom(first, second)
  const exit = stepsFrom(second, after)
  if (inside === -1 && exit === 1) return 'lower-neighbour'
  if (inside === 1 && exit === -1) return 'upper-neighbour'
  const isRun =
    Math.abs(inside) === 1 && exit === inside && (before === null || stepsFrom(before, first) === inside)
  return isRun ? 'run' : null
}
