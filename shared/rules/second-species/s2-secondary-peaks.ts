import { z } from 'zod'
import { cite } from '@/shared/rules/cite'
import { breachAt, goOn, isNoted, pack, packPitch, PITCH_ROOM, type Noted } from '@/shared/rules/fold'
import type { Breach, Rule } from '@/shared/rules/rule'
import { passingExample, PASSING_LINE, shortExample } from '@/shared/rules/second-species/examples'
import { SECOND_SPECIES } from '@/shared/rules/second-species/folds'
import { directionFrom, type Direction } from '@/shared/theory/interval'
import { comparePitches } from '@/shared/theory/pitch'

const PARAMS = z.strictObject({
  least: z.int().min(0).max(99).default(1).describe('Lower peaks that the line should have.'),
  most: z
    .int()
    .min(1)
    .max(99)
    .default(99)
    .describe(
      'Lower peaks that it should not exceed. The source says one or two, and does not say what counts.',
    ),
})
type Params = z.infer<typeof PARAMS>

/** The highest peaks so far, all of one pitch, and those under them. */
type State = Readonly<{
  before: Noted | null
  direction: Direction
  tops: readonly Noted[]
  lower: readonly Noted[]
}>

export const s2SecondaryPeaks: Rule<State, Params> = {
  id: 's2-secondary-peaks',
  level: 'preference',
  scope: 'line',
  species: SECOND_SPECIES,
  params: PARAMS,
  start: () => ({ before: null, direction: 0, tops: [], lower: [] }),
  step: (state, moment) => {
    if (!isNoted(moment)) return goOn(moment.note === null ? { ...state, before: null, direction: 0 } : state)
    const { before } = state
    if (before === null) return goOn({ ...state, before: moment })
    const direction = directionFrom(before.note, moment.note)
    if (direction === 0) return goOn({ ...state, before: moment })
    const isPeak = state.direction > 0 && direction < 0
    return goOn({ ...(isPeak ? addPeak(state, before) : state), before: moment, direction })
  },
  finish: ({ before, direction, tops, lower }, { least, most }, isComplete): Breach | null => {
    if (!isComplete || before === null) return null
    // A line that ends on its highest note has its climax there, and every peak before it is a lower one.
    const top = tops[0]
    const endsOnTop = direction > 0 && top !== undefined && comparePitches(before.note, top.note) > 0
    const peaks = endsOnTop ? [...lower, ...tops] : lower
    const count = peaks.length
    if (count < least) return breachAt('line', count === 0 ? 'none' : 'too-few', [before], { count, least })
    return count > most ? breachAt('line', 'too-many', peaks, { count, most }) : null
  },
  key: ({ before, direction, tops, lower }) =>
    pack(
      [packPitch(before && before.note), PITCH_ROOM],
      [direction + 1, 3],
      [packPitch(tops[0]?.note ?? null), PITCH_ROOM],
      [tops.length, 256],
      [lower.length, 256],
    ),
  explain: {
    title: 'Lower peaks along the way',
    statement: 'Beside its one highest point the line has a lower peak or two.',
    why: 'With twice as many notes one arch is too long; smaller ones inside it keep the line alive.',
    mends: 'Let the line rise and fall once more, below its climax.',
    sources: cite('OMT1'),
    right: passingExample(PASSING_LINE),
    wrong: shortExample('r:2,D5:2 C5:2,A4:2 G4:2,C#5:2 D5', [4]),
    messages: {
      none: 'The line has no lower peak beside its highest point.',
      'too-few': 'The line has {count} lower peaks beside its highest point, fewer than {least}.',
      'too-many': 'The line has {count} lower peaks beside its highest point, more than {most}.',
    },
  },
}

/** Takes in one more peak: the highest so far, as high as it, or under it. */
function addPeak(state: State, peak: Noted): State {
  const top = state.tops[0]
  const order = top === undefined ? 1 : comparePitches(peak.note, top.note)
  if (order < 0) return { ...state, lower: [...state.lower, peak] }
  if (order === 0) return { ...state, tops: [...state.tops, peak] }
  return { ...state, tops: [peak], lower: [...state.lower, ...state.tops] }
}
