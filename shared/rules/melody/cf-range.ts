import { z } from 'zod'
import { ALL_SPECIES, asRemark, breachAt, goOn, isNoted, pack, spanArgs } from '@/shared/rules/fold'
import { EXTREMES_ROOM, packExtremes, widen, type Extremes } from '@/shared/rules/melody/extremes'
import type { Rule, Voice } from '@/shared/rules/rule'
import { stepsFrom } from '@/shared/theory/interval'
import { nameSize } from '@/shared/theory/interval-name'

const params = z.strictObject({
  most: z
    .int()
    .min(3)
    .max(22)
    .default(10)
    .describe('Widest span, as the number of the interval: 8 is an octave, 10 a tenth.'),
  preferred: z
    .int()
    .min(3)
    .max(22)
    .default(22)
    .describe('Span that taste prefers; a wider one is told as a remark.'),
})
type Params = z.infer<typeof params>

/** How far the line has been reported: not at all, as wider than taste likes, as too wide. */
type Said = 0 | 1 | 2
type State = Readonly<{ voice: Voice; extremes: Extremes | null; said: Said }>

export const cfRange: Rule<State, Params> = {
  id: 'cf-range',
  level: 'law',
  scope: 'cantus',
  species: ALL_SPECIES,
  params,
  start: (_exercise, _params, voice) => ({ voice, extremes: null, said: 0 }),
  // Once too wide, always too wide: unwritten bars change nothing, and it is said once.
  step: (state, moment, { most, preferred }) => {
    if (!isNoted(moment) || state.said === 2) return goOn(state)
    const { voice, said } = state
    const extremes = widen(state.extremes, moment)
    const { low, high } = extremes
    const size = stepsFrom(low.note, high.note) + 1
    const isTooWide = size > most
    if (!isTooWide && (size <= preferred || said === 1)) {
      return goOn({ voice, extremes, said })
    }
    const limit = nameSize((isTooWide ? most : preferred) - 1)
    const code = isTooWide ? 'too-wide' : 'rather-wide'
    const breach = breachAt(voice, code, [low, high], { ...spanArgs(low, high), limit })
    return isTooWide
      ? { state: { voice, extremes, said: 2 }, breach }
      : { state: { voice, extremes, said: 1 }, breach: asRemark(breach) }
  },
  finish: () => null,
  key: ({ extremes, said }) =>
    said === 2 ? 2 : 3 + pack([packExtremes(extremes), EXTREMES_ROOM], [said, 2]),
  explain: {
    title: 'A cantus within reach',
    statement:
      'The span from the lowest to the highest note of the cantus is limited: a tenth at the very most, better an octave.',
    why: 'A narrow span is sung without strain and is heard as one voice.',
    mends: 'Bring the extreme note closer: let the peak be a step lower, or turn the descent earlier.',
    sources: [
      { source: 'OMT1', place: 'cantus firmus' },
      { source: 'VIGIL' },
      { source: 'CFH', place: 'rule 8' },
      { source: 'ECR', place: 'rule 1' },
      { source: 'EX', place: 'Fux spans a fifth to an octave' },
    ],
    right: { cantus: 'D4 F4 E4 A4 C5 B4 A4 G4 F4 E4 D4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 F4 A4 D5 G5 F5 E5 D5 A4 E4 D4', mode: 'dorian', final: 'D', breaches: [5] },
    messages: {
      'too-wide': 'From {from} to {to} is a {interval}; the whole cantus stays within a {limit}.',
      'rather-wide': 'From {from} to {to} is a {interval}; a cantus is better kept within a {limit}.',
    },
    disagreement:
      'All agree on a tenth as the ceiling; the span they like best is a fifth or sixth, or an octave.',
  },
}
