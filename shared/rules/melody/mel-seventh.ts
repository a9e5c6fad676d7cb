import { z } from 'zod'
import { ALL_SPECIES, breachAt, foldPairs, spanArgs, type OneBehind } from '@/shared/rules/fold'
import type { Rule } from '@/shared/rules/rule'
import { semitonesFrom, stepsFrom } from '@/shared/theory/interval'

const params = z.strictObject({
  minorInsideBar: z
    .boolean()
    .default(false)
    .describe('Whether a minor seventh may be leapt within one bar, over an unchanged cantus note.'),
})
type Params = z.infer<typeof params>

export const melSeventh: Rule<OneBehind, Params> = {
  id: 'mel-seventh',
  level: 'law',
  scope: 'melody',
  species: ALL_SPECIES,
  params,
  ...foldPairs<Params>((before, now, { minorInsideBar }, { voice }) => {
    const size = Math.abs(stepsFrom(before.note, now.note))
    if (size < 6 || size === 7) return null
    if (size > 7) return breachAt(voice, 'beyond-octave', [before, now], spanArgs(before, now))
    const isMinor = Math.abs(semitonesFrom(before.note, now.note)) === 10
    if (minorInsideBar && isMinor && before.bar === now.bar) return null
    return breachAt(voice, 'seventh', [before, now], spanArgs(before, now))
  }),
  explain: {
    title: 'No leap of a seventh, none beyond an octave',
    statement: 'A line does not leap a seventh, and never further than an octave.',
    why: 'A seventh is a dissonance the ear cannot bridge without a chord to lean on; beyond the octave the line breaks into two.',
    mends: 'Leap an octave and step back, or walk part of the way.',
    sources: [
      { source: 'CFH', place: 'rule 3' },
      { source: 'GENN' },
      { source: 'RWU' },
      { source: 'CCC' },
      { source: 'HSR' },
      { source: 'LEHM', place: 'lesson I' },
    ],
    right: { cantus: 'D4 D5 C5 B4 A4', mode: 'dorian', final: 'D', breaches: [] },
    wrong: { cantus: 'D4 C5 B4 G3 D4', mode: 'dorian', final: 'D', breaches: [2, 4] },
    messages: {
      seventh: 'From {from} to {to} the line leaps a {interval}.',
      'beyond-octave': 'From {from} to {to} is a {interval}, wider than an octave.',
    },
    disagreement: 'Lehmann allows the minor seventh while the harmony stays.',
  },
}
